/** Tailwind 4 runs as the only PostCSS plugin; its settings are in tailwind.config.ts. */
const config = { plugins: { '@tailwindcss/postcss': {} } };

export default config;
