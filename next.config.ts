import type { NextConfig } from 'next';
import { FIXED_HEADERS } from './lib/shared/fixed-headers';

const config: NextConfig = {
  turbopack: { root: import.meta.dirname },
  // Bundled, the first breaks in production and the second loses its compiled part.
  serverExternalPackages: ['piscina', '@node-rs/argon2', 'mysql2', 'pino'],
  poweredByHeader: false,
  reactStrictMode: true,
  // Nothing here serves other people's pictures, and the optimiser has been a way in more than once.
  images: { unoptimized: true },
  headers: async () => [
    { source: '/:path*', headers: Object.entries(FIXED_HEADERS).map(([key, value]) => ({ key, value })) },
  ],
};

export default config;
