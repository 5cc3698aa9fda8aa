import type { Config } from 'tailwindcss';

/** The whole palette and the three type sizes: what is not here has no class, so no page can leave the design. */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      inherit: 'inherit',
      paper: 'var(--paper)',
      sheet: 'var(--sheet)',
      ink: 'var(--ink)',
      faint: 'var(--faint)',
      rule: 'var(--rule)',
      edge: 'var(--edge)',
      grid: 'var(--grid)',
      off: 'var(--off)',
      triode: 'var(--triode)',
      saturated: 'var(--saturated)',
      missed: 'var(--missed)',
      focus: 'var(--focus)',
    },
    fontFamily: {
      mono: ["'JetBrains Mono'", 'ui-monospace', 'monospace'],
    },
    fontSize: {
      xs: ['0.75rem', '1rem'],
      sm: ['0.875rem', '1.25rem'],
      xl: ['1.25rem', '1.75rem'],
    },
    fontWeight: { normal: '400', bold: '700' },
    borderRadius: { none: '0' },
    boxShadow: { slip: '0 6px 24px var(--shade)', none: 'none' },
  },
} satisfies Config;
