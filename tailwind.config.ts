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
        edge: token('edge'),
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
        'warn-soft': token('warn-soft'),
        danger: token('danger'),
        'danger-soft': token('danger-soft'),
      },
      fontFamily: {
        sans: ['"Roboto Flex Variable"', '"Roboto Flex"', 'sans-serif'],
      },
      fontSize: {
        tick: ['11px', '1.35'],
        small: ['12px', '1.4'],
        note: ['12.5px', '1.45'],
        body: ['14px', '1.45'],
        lead: ['15px', '1.5'],
        title: ['20px', '1.25'],
        reading: ['25px', '1.2'],
      },
      borderRadius: { box: '6px', control: '8px', card: '10px' },
      boxShadow: { float: 'var(--shadow)' },
    },
  },
} satisfies Config;
