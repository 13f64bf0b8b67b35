import { restrictions } from './server/lint/rooms.mjs';
import withNuxt from './.nuxt/eslint.config.mjs';

export default withNuxt(
  { ignores: ['fixtures/**', 'server/db/migrations/**'] },
  {
    name: 'tallyrail/everywhere',
    rules: {
      'eqeqeq': ['error', 'always'],
      'no-console': 'off',
    },
  },
  {
    name: 'tallyrail/typescript',
    files: ['**/*.ts', '**/*.vue'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    },
  },
  {
    name: 'tallyrail/vue',
    files: ['**/*.vue'],
    rules: {
      'vue/html-self-closing': 'off',
      'vue/max-attributes-per-line': 'off',
      'vue/singleline-html-element-content-newline': 'off',
      'vue/no-multiple-template-root': 'off', // Vue 3 takes several
      'vue/require-default-prop': 'off', // TypeScript says which may be undefined
    },
  },
  ...restrictions,
);
