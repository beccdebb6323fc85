import type { MetadataRoute } from 'next';

/** What a phone needs to install the field app. */
export default function manifest(): MetadataRoute.Manifest {
  return {
    id: '/field',
    name: 'Undereave',
    short_name: 'Undereave',
    description: 'Reads a paper-wasp comb cell by cell, with no signal.',
    lang: 'en',
    start_url: '/field',
    scope: '/',
    display: 'standalone',
    background_color: '#ffffff',
    theme_color: '#ffffff',
    icons: [
      { src: '/icons/icon-192.png', sizes: '192x192', type: 'image/png', purpose: 'any' },
      { src: '/icons/icon-512.png', sizes: '512x512', type: 'image/png', purpose: 'any' },
      { src: '/icons/maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
      { src: '/icons/monochrome-512.png', sizes: '512x512', type: 'image/png', purpose: 'monochrome' },
      { src: '/icons/monochrome.svg', sizes: 'any', type: 'image/svg+xml', purpose: 'monochrome' },
    ],
    screenshots: [
      {
        src: '/screenshots/comb-narrow.png',
        sizes: '780x1688',
        type: 'image/png',
        form_factor: 'narrow',
        label: 'A comb as last read, with its tally',
      },
      {
        src: '/screenshots/nests-wide.png',
        sizes: '1280x800',
        type: 'image/png',
        form_factor: 'wide',
        label: 'The nests on this phone',
      },
    ],
    shortcuts: [
      { name: 'Nests', url: '/field', icons: [{ src: '/icons/shortcut-96.png', sizes: '96x96', type: 'image/png' }] },
      {
        name: 'Start a nest',
        url: '/field/nests/new',
        icons: [{ src: '/icons/shortcut-96.png', sizes: '96x96', type: 'image/png' }],
      },
      {
        name: 'Not sent yet',
        url: '/field/unsent',
        icons: [{ src: '/icons/shortcut-96.png', sizes: '96x96', type: 'image/png' }],
      },
    ],
  };
}
