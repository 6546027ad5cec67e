import type { Config } from 'tailwindcss';

/**
 * Tokens by meaning, not by hue. Each colour is a CSS variable of app/globals.css, where the light and the dark value
 * stand side by side; components/ui/contrast.test.ts checks the pairs. Tailwind's own palette is not offered: a page
 * that wants a colour has to say what it means.
 *
 *   paper   the ground (raised: a sheet on it, sunk: a well in it)     ink    what is written (soft: second voice)
 *   line    rules (strong: the edge of something to operate)           glass  the one accent: act, link, in order
 *   needs   "needs you", and nothing else                              fails  "fails", and nothing else
 */
const config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      paper: { DEFAULT: 'var(--paper)', raised: 'var(--paper-raised)', sunk: 'var(--paper-sunk)' },
      ink: { DEFAULT: 'var(--ink)', soft: 'var(--ink-soft)' },
      line: { DEFAULT: 'var(--line)', strong: 'var(--line-strong)' },
      glass: {
        DEFAULT: 'var(--glass)',
        strong: 'var(--glass-strong)',
        wash: 'var(--glass-wash)',
        on: 'var(--glass-on)',
      },
      needs: { DEFAULT: 'var(--needs)', wash: 'var(--needs-wash)' },
      fails: {
        DEFAULT: 'var(--fails)',
        strong: 'var(--fails-strong)',
        wash: 'var(--fails-wash)',
        on: 'var(--fails-on)',
      },
    },
    fontFamily: {
      sans: ['Lato', 'system-ui', 'sans-serif'],
      mono: ['ui-monospace', 'SFMono-Regular', 'Menlo', 'Consolas', 'monospace'],
    },
    fontSize: {
      xs: ['0.75rem', { lineHeight: '1rem' }],
      sm: ['0.8125rem', { lineHeight: '1.125rem' }],
      base: ['0.9375rem', { lineHeight: '1.4rem' }],
      // 16 px: the smallest a phone shows in an input without zooming the page.
      input: ['1rem', { lineHeight: '1.375rem' }],
      lg: ['1.125rem', { lineHeight: '1.5rem' }],
      xl: ['1.375rem', { lineHeight: '1.75rem' }],
      '2xl': ['1.75rem', { lineHeight: '2.125rem' }],
      '3xl': ['2.25rem', { lineHeight: '2.5rem' }],
    },
    borderRadius: { none: '0', sm: '2px', DEFAULT: '4px', lg: '8px', full: '9999px' },
    boxShadow: {
      none: 'none',
      sheet: '0 1px 0 var(--line)',
      lifted: '0 1px 2px var(--shade), 0 12px 32px -8px var(--shade)',
    },
    extend: {
      // 44 px: what a gloved finger hits.
      spacing: { target: '2.75rem', bar: '3.5rem' },
      maxWidth: { page: '82rem', prose: '42rem', form: '32rem' },
      minHeight: { target: '2.75rem' },
      minWidth: { target: '2.75rem' },
    },
  },
} satisfies Config;

export default config;
