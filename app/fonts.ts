import localFont from 'next/font/local';

/** The reading face: Atkinson Hyperlegible Next, shipped with the product (licence beside the files). */
export const next = localFont({
  variable: '--font-next',
  display: 'swap',
  src: [
    { path: '../fonts/atkinson-hyperlegible-next-latin-400-normal.woff2', weight: '400', style: 'normal' },
    { path: '../fonts/atkinson-hyperlegible-next-latin-400-italic.woff2', weight: '400', style: 'italic' },
    { path: '../fonts/atkinson-hyperlegible-next-latin-700-normal.woff2', weight: '700', style: 'normal' },
  ],
});

/** Its mono: numbers in tables and codes of nests. */
export const mono = localFont({
  variable: '--font-mono',
  display: 'swap',
  src: [
    { path: '../fonts/atkinson-hyperlegible-mono-latin-400-normal.woff2', weight: '400', style: 'normal' },
    { path: '../fonts/atkinson-hyperlegible-mono-latin-700-normal.woff2', weight: '700', style: 'normal' },
  ],
});
