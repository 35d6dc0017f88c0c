import type { Config } from 'tailwindcss'

/** Names for what app/globals.css defines: colours by role, never by shade; six sizes; square corners. */
export default {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      page: 'var(--page)',
      sheet: 'var(--sheet)',
      ink: 'var(--ink)',
      soft: 'var(--soft)',
      hair: 'var(--hair)',
      wash: 'var(--wash)',
      blue: 'var(--blue)',
      amber: 'var(--amber)',
      verm: 'var(--verm)',
      green: 'var(--green)',
    },
    fontSize: {
      '12': ['0.75rem', '1.125rem'],
      '13': ['0.8125rem', '1.25rem'],
      '15': ['0.9375rem', '1.5rem'],
      '18': ['1.125rem', '1.625rem'],
      '24': ['1.5rem', '1.875rem'],
      '34': ['2.125rem', '2.5rem'],
    },
    fontFamily: {
      sans: ['var(--font-archivo)', 'var(--font-archivo-ext)', 'system-ui', 'sans-serif'],
      mono: ['var(--font-commit)', 'ui-monospace', 'monospace'],
    },
    borderRadius: { none: '0', control: '2px' },
    boxShadow: { float: '0 2px 12px rgb(8 12 18 / 0.28)' },
    screens: { tablet: '40rem', desk: '64rem', wide: '80rem' },
    extend: {},
  },
} satisfies Config
