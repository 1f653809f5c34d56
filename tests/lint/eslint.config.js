import { dirname, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import tseslint from 'typescript-eslint';

const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..');

/** Time, chance and the environment come in as arguments: a result must not depend on when it is asked for. */
const noHiddenInputs = [
  {
    selector: "MemberExpression[object.name='Math'][property.name='random']",
    message: 'Randomness comes in as an argument (a seeded generator).',
  },
  {
    selector: "MemberExpression[object.name='crypto']",
    message: 'Randomness comes in as an argument (a seeded generator).',
  },
  {
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: 'Time comes in as an argument.',
  },
  {
    selector: "CallExpression[callee.name='Date']",
    message: 'Time comes in as an argument.',
  },
  {
    selector: "MemberExpression[object.name='Date'][property.name='now']",
    message: 'Time comes in as an argument.',
  },
  {
    selector: "MemberExpression[object.name='performance'][property.name='now']",
    message: 'Time comes in as an argument.',
  },
];
const environmentMessage = 'Only server/config reads the environment.';
const noEnvironment = [
  {
    selector: "MemberExpression[object.name='process'][property.name='env']",
    message: environmentMessage,
  },
  { selector: "VariableDeclarator[init.name='process']", message: environmentMessage },
  {
    selector: "ImportDeclaration[source.value='node:process']",
    message: environmentMessage,
  },
];
const noDefaultExport = {
  selector: 'ExportDefaultDeclaration',
  message: 'Named exports only.',
};
const maxLines = ['error', { max: 300, skipBlankLines: true, skipComments: true }];

export default tseslint.config(
  { ignores: ['**/node_modules/**', 'dist/**', '.data/**'] },
  {
    basePath: root,
    // A rule that can be switched off beside the code is a wish.
    linterOptions: { noInlineConfig: true },
  },
  {
    basePath: root,
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.recommended],
    languageOptions: {
      parserOptions: {
        project: 'tests/lint/tsconfig.json',
        tsconfigRootDir: root,
      },
    },
    rules: {
      'max-lines': maxLines,
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': [
        'error',
        { 'ts-ignore': true, 'ts-expect-error': true, 'ts-nocheck': true },
      ],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      'no-restricted-syntax': ['error', noDefaultExport, ...noEnvironment],
    },
  },
  {
    basePath: root,
    // What runs before anything is installed: plain JavaScript, typed by its comments.
    files: ['**/*.mjs'],
    extends: [tseslint.configs.recommended],
    rules: {
      'max-lines': maxLines,
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      'no-restricted-syntax': ['error', noDefaultExport, ...noEnvironment],
    },
  },
  {
    basePath: root,
    files: ['shared/**/*.ts', 'fixtures/**/*.ts'],
    rules: {
      'no-restricted-syntax': ['error', noDefaultExport, ...noEnvironment, ...noHiddenInputs],
    },
  },
  {
    basePath: root,
    files: [
      'server/config/**/*.ts',
      'server/cli/**/*.ts',
      'server/cli/**/*.mjs',
      'tests/**/*.ts',
      'tests/**/*.tsx',
    ],
    rules: { 'no-restricted-syntax': ['error', noDefaultExport], 'no-console': 'off' },
  },
  {
    basePath: root,
    // What a tool loads by its default export.
    files: [
      '*.config.ts',
      'tests/support/*-reporter.ts',
      'tests/support/*-global-setup.ts',
      'tests/e2e/gallery/**',
    ],
    rules: { 'no-restricted-syntax': 'off' },
  },
);
