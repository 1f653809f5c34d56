import type { Config } from 'tailwindcss';
import plugin from 'tailwindcss/plugin';

/**
 * Drawing-office paper and ink. Vermilion (`evidence`) marks signs of looseness and nothing else,
 * blue-green (`fit`) marks fits and nothing else; everything else is ink in three strengths.
 * The text pairs are held to WCAG 2.2 AA by tests/client/components/contrast.test.ts.
 */
export const palettes = {
  light: {
    paper: '#f4efe2',
    sheet: '#fbf8f0',
    well: '#e9e2d0',
    ink: '#1b2128',
    'ink-soft': '#454b52',
    'ink-faint': '#5f625f',
    hairline: '#d3cab4',
    rule: '#7f7868',
    evidence: '#b5300f',
    'evidence-wash': '#f5dccf',
    fit: '#0b6361',
    'fit-wash': '#d3e5dd',
    explained: '#7b776c',
  },
  dark: {
    paper: '#191a18',
    sheet: '#21221f',
    well: '#32332e',
    ink: '#ece5d4',
    'ink-soft': '#c4bcaa',
    'ink-faint': '#a39c8c',
    hairline: '#3e3e38',
    rule: '#8b8677',
    evidence: '#ff8560',
    'evidence-wash': '#4b2418',
    fit: '#62c5ba',
    'fit-wash': '#173d39',
    explained: '#8f8a7c',
  },
} as const;

export type PaletteToken = keyof (typeof palettes)['light'];

function variables(palette: Readonly<Record<PaletteToken, string>>): Record<string, string> {
  return Object.fromEntries(
    Object.entries(palette).map(([token, value]) => [`--tone-${token}`, value]),
  );
}

const colors = Object.fromEntries(
  Object.keys(palettes.light).map((token) => [token, `var(--tone-${token})`]),
);

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    colors: { ...colors, transparent: 'transparent', current: 'currentColor' },
    fontFamily: {
      sans: ['"Archivo Variable"', '"Fretline Signs"', 'system-ui', 'sans-serif'],
      figures: [
        '"Sometype Mono Variable"',
        '"Fretline Signs"',
        'ui-monospace',
        'SFMono-Regular',
        'monospace',
      ],
    },
    fontSize: {
      '2xs': ['0.6875rem', '0.9375rem'],
      xs: ['0.75rem', '1rem'],
      sm: ['0.8125rem', '1.1875rem'],
      base: ['0.9375rem', '1.375rem'],
      lg: ['1.0625rem', '1.5rem'],
      xl: ['1.3125rem', '1.6875rem'],
      '2xl': ['1.6875rem', '2.0625rem'],
    },
    // Paper is cut square.
    borderRadius: { none: '0', sm: '1px', full: '9999px' },
    // Sheets lie on one another; nothing floats.
    boxShadow: { none: 'none', sheet: '3px 3px 0 0 var(--tone-hairline)' },
    extend: {
      screens: { phone: '40rem' },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ':root, [data-theme="light"]': { ...variables(palettes.light), 'color-scheme': 'light' },
        '@media (prefers-color-scheme: dark)': {
          ':root:not([data-theme])': { ...variables(palettes.dark), 'color-scheme': 'dark' },
        },
        '[data-theme="dark"]': { ...variables(palettes.dark), 'color-scheme': 'dark' },
      });
    }),
  ],
} satisfies Config;
