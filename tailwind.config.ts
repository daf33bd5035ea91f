import type { Config } from 'tailwindcss';
import plugin from 'tailwindcss/plugin';
import { themes, type TokenName } from './src/app/tokens.ts';

/** A token as CSS variable, so that light and dark (field) mode share every class. */
const variable = (token: TokenName): string => `var(--${token})`;
const variables = (theme: Record<TokenName, string>): Record<string, string> => Object.fromEntries(Object.entries(theme).map(([token, colour]) => [`--${token}`, colour]));

/** Colour runs night → twilight → daylight, so it also reads in grey and for colour-blind eyes. */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        night: variable('night'),
        dusk: { DEFAULT: variable('dusk'), pale: variable('dusk-pale') },
        rose: { DEFAULT: variable('rose'), pale: variable('rose-pale'), deep: variable('rose-deep') },
        straw: { DEFAULT: variable('straw'), pale: variable('straw-pale') },
        paper: { DEFAULT: variable('paper'), raised: variable('paper-raised'), sunk: variable('paper-sunk') },
        ink: { DEFAULT: variable('ink'), soft: variable('ink-soft') },
        needle: { DEFAULT: variable('needle'), deep: variable('needle-deep'), on: variable('needle-on') },
      },
      fontFamily: { sans: ['"Roboto Flex Variable"', '"Roboto Flex"', 'system-ui', 'sans-serif'] },
      minHeight: { touch: '3rem' },
      minWidth: { touch: '3rem' },
    },
  },
  plugins: [plugin(({ addBase }) => addBase({ ':root': variables(themes.light), '[data-theme="dark"]': variables(themes.dark) }))],
} satisfies Config;
