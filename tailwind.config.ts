import type { Config } from 'tailwindcss';

/**
 * The one home of Strikeoff's design tokens. Colours are CSS variables so that the dark theme,
 * defined from the same names in app/globals.css, needs no second set of classes.
 */
const token = (name: string) => `var(--${name})`;

export default {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        paper: token('paper'),
        sheet: token('sheet'),
        desk: token('desk'),
        band: token('band'),
        tab: token('tab'),
        canary: {
          DEFAULT: token('canary'),
          deep: token('canary-deep'),
          soft: token('canary-soft'),
        },
        pink: { DEFAULT: token('pink'), deep: token('pink-deep'), soft: token('pink-soft') },
        ink: { DEFAULT: token('ink'), soft: token('ink-soft') },
        carbon: { DEFAULT: token('carbon'), on: token('carbon-on') },
        keel: token('keel'),
        moss: token('moss'),
        wet: token('wet'),
        cured: token('cured'),
      },
      fontFamily: {
        head: ['var(--font-besley)', 'serif'],
        body: ['var(--font-public-sans)', 'sans-serif'],
        code: ['var(--font-sometype)', 'monospace'],
      },
    },
  },
} satisfies Config;
