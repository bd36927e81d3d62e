import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import vue from 'eslint-plugin-vue';
import globals from 'globals';
import ts from 'typescript-eslint';

/** Folders that a part of the house may not reach into. */
const forbid = (...patterns) => ({
  'no-restricted-imports': ['error', { patterns }],
});
const SERVER = { group: ['**/server/**', '@/../server/**'], message: 'The server is not imported from here.' };
const CLIENT = { group: ['**/src/**', '@/**'], message: 'The client is not imported from here.' };
const NODE = {
  group: ['node:*', 'express', 'express-*', 'knex', 'pg', 'vue', 'vue-*', 'quasar', 'pinia', 'sharp', 'stripe'],
  message: 'shared runs anywhere: neither Node, the DOM, Vue, Express nor Knex.',
};
const FAKES = { group: ['**/fakes/**'], message: 'Fakes are processes of their own.' };

export default ts.config(
  { ignores: ['dist/**', 'node_modules/**', '.data/**', 'public/**', 'content/**', 'test-results/**'] },
  js.configs.recommended,
  ...ts.configs.recommended,
  ...vue.configs['flat/recommended'],
  {
    files: ['**/*.{ts,vue,mjs,js}'],
    languageOptions: { globals: { ...globals.node } },
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/consistent-type-imports': 'error',
      eqeqeq: 'error',
      'no-console': ['error', { allow: ['error', 'warn'] }],
    },
  },
  {
    files: ['**/*.vue'],
    languageOptions: { parserOptions: { parser: ts.parser }, globals: { ...globals.browser } },
    rules: {
      'vue/block-order': ['error', { order: ['script', 'template', 'style'] }],
      'vue/component-api-style': ['error', ['script-setup']],
      'vue/multi-word-component-names': ['error', { ignores: ['App'] }],
      // What stands in AppMarkdown was sanitised by the server.
      'vue/no-v-html': 'error',
      'vue/require-default-prop': 'off',
    },
  },
  { files: ['src/components/AppMarkdown.vue'], rules: { 'vue/no-v-html': 'off' } },
  { files: ['src/**/*.{ts,vue}'], languageOptions: { globals: { ...globals.browser } }, rules: forbid(SERVER) },
  { files: ['shared/**/*.ts'], rules: forbid(SERVER, CLIENT, NODE) },
  { files: ['server/**/*.ts'], ignores: ['server/fakes/**'], rules: forbid(CLIENT, FAKES) },
  {
    files: ['server/**/*.{service,queries}.ts'],
    rules: forbid(CLIENT, FAKES, { group: ['**/*.routes.ts'], message: 'Routes call services, not the other way.' }),
  },
  {
    files: ['server/**/*.queries.ts'],
    rules: forbid(CLIENT, FAKES, {
      group: ['**/*.routes.ts', '**/*.service.ts'],
      message: 'Queries are called by services, not the other way.',
    }),
  },
  {
    files: ['server/**/*.ts', 'shared/**/*.ts', 'seeds/**/*.ts'],
    ignores: ['server/settings.ts', 'server/launch/**', 'server/fakes/**'],
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'process', property: 'env', message: 'Settings are read in server/settings.ts only.' },
      ],
    },
  },
  {
    files: ['src/**/*.ts', 'shared/**/*.ts', 'server/**/*.ts', 'seeds/**/*.ts', 'migrations/**/*.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        { selector: 'ExportDefaultDeclaration', message: 'Exports are named; default only where a tool asks.' },
      ],
    },
  },
  prettier,
);
