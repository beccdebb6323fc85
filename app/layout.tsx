import type { Metadata, Viewport } from 'next';
import type { ReactElement, ReactNode } from 'react';
import { CombSymbols } from '@/components/comb/comb-symbols';
import { mono, next } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Undereave', template: '%s · Undereave' },
  description: 'Records the nests of native paper wasps cell by cell, and dates their brood.',
  applicationName: 'Undereave',
  manifest: '/manifest.webmanifest',
  icons: {
    icon: [
      { url: '/icons/mark.svg', type: 'image/svg+xml' },
      { url: '/icons/icon-192.png', sizes: '192x192', type: 'image/png' },
    ],
    apple: [{ url: '/icons/apple-180.png', sizes: '180x180' }],
  },
  appleWebApp: { capable: true, title: 'Undereave', statusBarStyle: 'default' },
  formatDetection: { telephone: false, date: false, address: false, email: false },
  robots: { index: false, follow: false },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: '#ffffff',
  colorScheme: 'light',
};

/** The frame of every page: faces of type and the symbols of the comb. */
export default function RootLayout({ children }: { children: ReactNode }): ReactElement {
  return (
    <html lang="en" suppressHydrationWarning className={`${next.variable} ${mono.variable}`}>
      <body>
        <CombSymbols />
        {children}
      </body>
    </html>
  );
}
