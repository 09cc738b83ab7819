import type { Config } from 'tailwindcss';

/**
 * The colours of an estuary, named by what they say: teal leads on, amber means soon,
 * rust means destruction, violet means "not yet". Used through `@config` in the style sheet.
 */
export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        ink: { DEFAULT: '#1d2b36', soft: '#3f5261', faint: '#5b6d7a' },
        paper: { DEFAULT: '#f5f8f8', raised: '#ffffff', sunk: '#e8eeee' },
        line: { DEFAULT: '#cfdadb', strong: '#74898f' },
        teal: { DEFAULT: '#0f6b6b', strong: '#0a5252', wash: '#dcefed' },
        amber: { DEFAULT: '#8a5a00', strong: '#6b4500', wash: '#fbeecb' },
        rust: { DEFAULT: '#9a3b1e', strong: '#7a2c14', wash: '#f8e2d9' },
        violet: { DEFAULT: '#5b4a94', strong: '#463873', wash: '#e9e4f5' },
      },
      fontFamily: {
        sans: ['Noto Sans', 'system-ui', 'sans-serif'],
      },
    },
  },
} satisfies Config;
