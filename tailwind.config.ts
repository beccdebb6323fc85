import type { Config } from 'tailwindcss';

/**
 * Design tokens. Colours are CSS variables (values in app/globals.css), so that the low-lamp theme and print
 * can change them without a second set of classes.
 */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        ink: 'var(--ink)',
        quiet: 'var(--quiet)',
        paper: 'var(--paper)',
        wash: 'var(--wash)',
        rule: 'var(--rule)',
        edge: 'var(--edge)',
        shade: 'var(--shade)',
        main: { DEFAULT: 'var(--main)', wash: 'var(--main-wash)', on: 'var(--on-main)' },
        stop: { DEFAULT: 'var(--stop)', wash: 'var(--stop-wash)', on: 'var(--on-stop)' },
        warn: { DEFAULT: 'var(--warn)', wash: 'var(--warn-wash)' },
        stage: {
          egg: 'var(--stage-egg)',
          small: 'var(--stage-small)',
          medium: 'var(--stage-medium)',
          large: 'var(--stage-large)',
          capped: 'var(--stage-capped)',
        },
      },
      fontFamily: {
        sans: ['var(--font-next)', 'system-ui', 'sans-serif'],
        mono: ['var(--font-mono)', 'ui-monospace', 'monospace'],
      },
      fontSize: {
        field: ['1.125rem', { lineHeight: '1.5' }],
        number: ['2.25rem', { lineHeight: '1.1' }],
      },
      minHeight: { lab: '2rem', field: '3.75rem', key: '5.625rem' },
      minWidth: { lab: '2rem', field: '3.75rem' },
      spacing: { gap: '1.125rem' },
      borderRadius: { DEFAULT: '0.375rem' },
      maxWidth: { page: '84rem', text: '44rem' },
    },
  },
};

export default config;
