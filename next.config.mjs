/** What every answer carries. The content policy of pages is set in proxy.ts, because it changes with each request. */
const EVERYWHERE = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'X-Frame-Options', value: 'DENY' },
  { key: 'Referrer-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
  // Browsers heed this over https only.
  { key: 'Strict-Transport-Security', value: 'max-age=31536000; includeSubDomains' },
  {
    key: 'Permissions-Policy',
    value:
      'camera=(self), geolocation=(self), screen-wake-lock=(self), microphone=(), payment=(), usb=(), browsing-topics=()',
  },
];

const NO_CONTENT = "default-src 'none'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'";

/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  // Types are checked by `npm run check`, over tests and workers too; the build does not repeat it.
  typescript: { ignoreBuildErrors: true },
  // Addresses of lists carry their filters; typed routes would ask for a cast at every one of them.
  typedRoutes: false,
  // Both load drivers by name at run time, which a bundler can't follow.
  serverExternalPackages: ['sequelize', 'mariadb'],
  // No page shows pictures through the optimiser, so its route stays shut.
  images: { unoptimized: true },
  // The phone app is one static page; its inner paths are the client's.
  rewrites: async () => ({
    beforeFiles: [{ source: '/field/:path((?!brood-worker\\.js$).+)', destination: '/field' }],
    afterFiles: [],
    fallback: [],
  }),
  headers: async () => [
    { source: '/:path*', headers: EVERYWHERE },
    { source: '/api/:path*', headers: [{ key: 'Content-Security-Policy', value: NO_CONTENT }] },
    { source: '/field/brood-worker.js', headers: [{ key: 'Content-Security-Policy', value: NO_CONTENT }] },
    { source: '/sw.js', headers: [{ key: 'Cache-Control', value: 'no-cache, max-age=0, must-revalidate' }] },
  ],
};

export default config;
