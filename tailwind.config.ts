import type { Config } from 'tailwindcss';

/** Colours are variables, set for both themes in src/styles/tokens.css, and named once here. */
const token = (name: string) => `var(--${name})`;

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        paper: token('paper'),
        raised: token('raised'),
        wash: token('wash'),
        rule: token('rule'),
        pencil: token('pencil'),
        soft: token('soft'),
        ink: token('ink'),
        accent: token('accent'),
        'accent-ink': token('accent-ink'),
        'on-ink': token('on-ink'),
        pass: token('pass'),
        close: token('close'),
        fail: token('fail'),
        wood: token('wood'),
        rise: token('rise'),
        drop: token('drop'),
      },
      fontFamily: {
        serif: ['Newsreader Variable', 'Georgia', 'serif'],
        sans: ['Public Sans Variable', 'system-ui', 'sans-serif'],
        mono: ['Spline Sans Mono Variable', 'ui-monospace', 'monospace'],
      },
      fontSize: {
        xs: ['0.75rem', '1.05rem'],
        sm: ['0.8125rem', '1.2rem'],
        base: ['0.875rem', '1.35rem'],
        lg: ['1.0625rem', '1.5rem'],
        xl: ['1.3125rem', '1.7rem'],
        '2xl': ['1.625rem', '2rem'],
        '3xl': ['2.125rem', '2.4rem'],
        '4xl': ['2.875rem', '3rem'],
      },
      borderRadius: { DEFAULT: '5px', lg: '8px', full: '999px' },
    },
  },
} satisfies Config;
