import next from 'eslint-config-next/core-web-vitals';
import typescript from 'eslint-config-next/typescript';

const config = [
  ...next,
  ...typescript,
  { ignores: ['.next/**', '.tmp/**', 'node_modules/**', 'data/**', 'coverage/**', 'next-env.d.ts'] },
  {
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-restricted-properties': [
        'error',
        {
          object: 'Math',
          property: 'random',
          message: 'Pass in a seeded generator, or use node:crypto for secrets.',
        },
      ],
      eqeqeq: ['error', 'always'],
    },
  },
];

export default config;
