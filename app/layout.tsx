import './globals.css';
import type { Metadata, Viewport } from 'next';
import { headers } from 'next/headers';
import type { ReactNode } from 'react';
import { fontClasses } from './_components/fonts';
import { Providers } from './_components/providers';

export const metadata: Metadata = {
  title: { default: 'Stillroom', template: '%s · Stillroom' },
  description: 'The closest blend to a wanted smell, from materials you can buy, within a price and within limits.',
  applicationName: 'Stillroom',
  icons: {
    icon: [
      { url: '/icon.svg', type: 'image/svg+xml' },
      { url: '/favicon.ico', sizes: '32x32' },
    ],
  },
  formatDetection: { telephone: false, email: false, address: false },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  viewportFit: 'cover',
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f7f7f7' },
    { media: '(prefers-color-scheme: dark)', color: '#0d0d0d' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  const nonce = (await headers()).get('x-nonce') ?? undefined;
  return (
    // The theme script writes data-theme before React wakes, so this one element may differ.
    <html lang="en-GB" className={fontClasses} suppressHydrationWarning>
      <head>{nonce ? <meta property="csp-nonce" content="" nonce={nonce} suppressHydrationWarning /> : null}</head>
      <body>
        <Providers nonce={nonce}>{children}</Providers>
      </body>
    </html>
  );
}
