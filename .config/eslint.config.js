import js from '@eslint/js'
import prettier from 'eslint-config-prettier'
import vue from 'eslint-plugin-vue'
import globals from 'globals'
import ts from 'typescript-eslint'

const top = new URL('..', import.meta.url).pathname

/** Folders a room may not import, as a rule; the compiler's references refuse them a second time. */
function wall(...rooms) {
  const group = rooms.map((room) => `**/${room}/**`)
  return {
    'no-restricted-imports': [
      'error',
      { patterns: [{ group, message: 'This room may not import that one.' }] },
    ],
  }
}

const noNode = {
  group: ['node:*', 'fs', 'path', 'pg', 'typeorm', 'express'],
  message: 'Nothing of Node or the server here.',
}

export default ts.config(
  {
    ignores: [
      'dist/',
      'node_modules/',
      '.data/',
      'coverage/',
      'test-results/',
      'playwright-report/',
      'public/',
    ],
  },
  js.configs.recommended,
  ...ts.configs.recommendedTypeChecked,
  ...vue.configs['flat/recommended'],
  {
    languageOptions: {
      parserOptions: {
        projectService: { allowDefaultProject: ['.config/*.js'] },
        tsconfigRootDir: top,
        extraFileExtensions: ['.vue'],
      },
    },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      'no-restricted-exports': ['error', { restrictDefaultExports: { direct: true } }],
      'object-shorthand': 'error',
      'prefer-const': 'error',
      '@typescript-eslint/ban-ts-comment': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
    },
  },
  {
    files: ['**/*.vue'],
    languageOptions: { parserOptions: { parser: ts.parser } },
    rules: {
      'vue/block-lang': ['error', { script: { lang: 'ts' } }],
      'vue/block-order': ['error', { order: ['script', 'template', 'style'] }],
      'vue/component-api-style': ['error', ['script-setup']],
      'vue/define-macros-order': 'error',
      'vue/multi-word-component-names': ['error', { ignores: ['App'] }],
      'vue/no-v-html': 'error',
      'vue/no-unused-refs': 'error',
      'vue/require-default-prop': 'off',
      // A component is one default export by its nature.
      'no-restricted-exports': 'off',
    },
  },
  { files: ['src/**'], languageOptions: { globals: globals.browser } },
  {
    files: ['server/**', 'seeds/**', 'tests/**', '.config/**', 'vite.config.ts'],
    languageOptions: { globals: globals.node },
  },
  {
    files: ['shared/**'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            noNode,
            {
              group: [
                '**/src/**',
                '**/server/**',
                '**/seeds/**',
                '**/tests/**',
                'vue',
                'vue-router',
                'pinia',
              ],
              message: 'Shared stands alone.',
            },
          ],
        },
      ],
      'no-restricted-globals': [
        'error',
        ...['window', 'document', 'navigator', 'location', 'localStorage', 'process', 'Buffer', 'fetch'],
      ],
    },
  },
  {
    files: ['src/**'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            noNode,
            {
              group: ['**/server/**', '**/seeds/**', '**/tests/**'],
              message: 'The client may import shared only.',
            },
          ],
        },
      ],
    },
  },
  { files: ['server/**'], rules: wall('src', 'seeds', 'tests') },
  { files: ['seeds/**'], rules: wall('src', 'tests') },
  {
    // Command-line programs talk to the person who started them; they do it through the streams, not console.
    files: ['server/setup/**/*.mjs', '.config/**'],
    extends: [ts.configs.disableTypeChecked],
  },
  {
    // These tools read a default export.
    files: ['tests/**', 'vite.config.ts', '.config/**', 'src/env.d.ts'],
    rules: { 'no-restricted-exports': 'off' },
  },
  {
    files: ['tests/**'],
    rules: {
      // Answers read over HTTP are untyped until a test looks at them.
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/unbound-method': 'off',
      'vue/one-component-per-file': 'off',
    },
  },
  prettier,
)
