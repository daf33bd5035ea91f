import type { Config } from 'tailwindcss';

/** Design tokens: colour runs night → twilight → daylight, so it also reads in grey and for colour-blind eyes. */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['class', '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        night: { DEFAULT: '#1e2440', deep: '#141931', soft: '#2c3358' },
        dusk: { DEFAULT: '#5d5a86', pale: '#d9d6e6', deep: '#48456d' },
        rose: { DEFAULT: '#c98f86', pale: '#f2dfdb', deep: '#8d4f46' },
        straw: { DEFAULT: '#f0b95b', pale: '#fbe9c6', deep: '#8a5a0b' },
        paper: { DEFAULT: '#fbf7ee', raised: '#fffdf8', sunk: '#f1ebdc' },
        ink: { DEFAULT: '#23261f', soft: '#55584d' },
        needle: { DEFAULT: '#2f5d50', deep: '#234a3f', pale: '#dce9e4' },
      },
      fontFamily: { sans: ['"Roboto Flex Variable"', '"Roboto Flex"', 'system-ui', 'sans-serif'] },
      minHeight: { touch: '3rem' },
      minWidth: { touch: '3rem' },
    },
  },
} satisfies Config;
