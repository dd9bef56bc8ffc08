import type { NextConfig } from 'next';

/** On every answer, built files too. The content security policy changes with each request: `proxy.ts`. */
const HEADERS = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Strict-Transport-Security': 'max-age=63072000; includeSubDomains',
  'Referrer-Policy': 'same-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy':
    'accelerometer=(), browsing-topics=(), camera=(), display-capture=(), geolocation=(), gyroscope=(), microphone=(), payment=(), usb=()',
};

const config: NextConfig = {
  turbopack: { root: import.meta.dirname },
  // Bundled, the first breaks in production and the second loses its compiled part.
  serverExternalPackages: ['piscina', '@node-rs/argon2', 'mysql2', 'pino'],
  poweredByHeader: false,
  reactStrictMode: true,
  // Nothing here serves other people's pictures, and the optimiser has been a way in more than once.
  images: { unoptimized: true },
  headers: async () => [
    { source: '/:path*', headers: Object.entries(HEADERS).map(([key, value]) => ({ key, value })) },
  ],
};

export default config;
