import type { Config } from 'tailwindcss';

/** Read by Tailwind 4 through `@config` in app/globals.css; colours are custom properties, so that one set of class names serves both schemes. */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-scheme="dark"]'],
  theme: {
    extend: {
      colors: {
        linen: 'var(--linen)',
        paper: 'var(--paper)',
        thread: 'var(--thread)',
        'thread-strong': 'var(--thread-strong)',
        ink: 'var(--ink)',
        'ink-soft': 'var(--ink-soft)',
        indigo: 'var(--indigo)',
        'indigo-strong': 'var(--indigo-strong)',
        'on-indigo': 'var(--on-indigo)',
        madder: 'var(--madder)',
        'madder-wash': 'var(--madder-wash)',
        weld: 'var(--weld)',
        'weld-ink': 'var(--weld-ink)',
        'weld-wash': 'var(--weld-wash)',
        verdigris: 'var(--verdigris)',
        'verdigris-wash': 'var(--verdigris-wash)',
      },
      fontFamily: {
        serif: ['"Newsreader Variable"', 'Georgia', 'serif'],
        sans: ['"Public Sans Variable"', 'system-ui', 'sans-serif'],
        mono: ['"IBM Plex Mono"', 'ui-monospace', 'monospace'],
      },
    },
  },
};

export default config;
