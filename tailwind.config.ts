import type { Config } from 'tailwindcss';

const color = (name: string) => `var(--${name})`;

/** Every colour is a token of globals.css, so that both themes and the priority bands work without a second class. */
const config: Config = {
  content: ['./app/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ground: color('ground'),
      raised: color('raised'),
      'raised-more': color('raised-more'),
      rule: color('rule'),
      edge: color('edge'),
      ink: color('ink'),
      second: color('second'),
      third: color('third'),
      stain: color('stain'),
      'on-stain': color('on-stain'),
      high: color('high'),
      'high-text': color('high-text'),
      'on-high': color('on-high'),
      medium: color('medium'),
      'medium-text': color('medium-text'),
      'on-medium': color('on-medium'),
      low: color('low'),
    },
    fontFamily: {
      sans: ['var(--font-hyper)', 'var(--font-hyper-ext)', 'system-ui', 'DejaVu Sans', 'sans-serif'],
      mono: ['var(--font-hyper-mono)', 'var(--font-hyper-mono-ext)', 'ui-monospace', 'DejaVu Sans Mono', 'monospace'],
    },
    fontSize: {
      xs: ['0.75rem', '1rem'],
      sm: ['0.84375rem', '1.125rem'],
      base: ['0.9375rem', '1.375rem'],
      lg: ['1.125rem', '1.625rem'],
      xl: ['1.375rem', '1.75rem'],
      '2xl': ['1.75rem', '2.125rem'],
      '3xl': ['2.25rem', '2.625rem'],
    },
    borderRadius: { none: '0', sm: '2px', DEFAULT: '3px', md: '4px', full: '9999px' },
    boxShadow: { none: 'none' },
  },
};

export default config;
