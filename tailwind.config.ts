import type { Config } from 'tailwindcss';

/** Colour tokens live as CSS variables in src/styles/tokens.css (light and dark); utilities read them here. */
const token = (name: string) => `var(--${name})`;

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        paper: token('paper'),
        panel: token('panel'),
        ink: token('ink'),
        muted: token('muted'),
        line: token('line'),
        accent: token('accent'),
        'accent-soft': token('accent-soft'),
        'on-accent': token('on-accent'),
        rotation: token('rotation'),
        ellipticity: token('ellipticity'),
        reflectance: token('reflectance'),
        magnet: token('magnet'),
        'magnet-soft': token('magnet-soft'),
        noble: token('noble'),
        refractory: token('refractory'),
        dielectric: token('dielectric'),
        semiconductor: token('semiconductor'),
        warn: token('warn'),
        danger: token('danger'),
      },
      fontFamily: {
        sans: ['"Roboto Flex Variable"', '"Roboto Flex"', 'sans-serif'],
      },
    },
  },
} satisfies Config;
