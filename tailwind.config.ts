import type { Config } from 'tailwindcss';

const token = (name: string) => `var(--${name})`;

const config: Config = {
  content: ['./app/**/*.{ts,tsx}', './components/**/*.{ts,tsx}', './lib/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        paper: { DEFAULT: token('paper'), raised: token('paper-raised'), wash: token('paper-wash') },
        ink: { DEFAULT: token('ink'), soft: token('ink-soft'), faint: token('ink-faint') },
        rule: { DEFAULT: token('rule'), strong: token('rule-strong') },
        press: { DEFAULT: token('press'), ink: token('press-ink'), strong: token('press-strong') },
        maize: { DEFAULT: token('maize'), ink: token('maize-ink'), wash: token('maize-wash') },
        warning: token('warning'),
        action: { DEFAULT: token('action'), ink: token('action-ink') },
        grey: token('grey'),
      },
      fontFamily: { sans: 'var(--sans)', serif: 'var(--serif)' },
      maxWidth: { page: '80rem', measure: '44rem' },
    },
  },
};

export default config;
