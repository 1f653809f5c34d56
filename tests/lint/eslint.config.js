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
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: 'Time comes in as an argument.',
  },
  {
    selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    message: 'Time comes in as an argument.',
  },
];
const noEnvironment = {
  selector: "MemberExpression[object.name='process'][property.name='env']",
  message: 'Only server/config reads the environment.',
};
const noDefaultExport = {
  selector: 'ExportDefaultDeclaration',
  message: 'Named exports only.',
};

export default tseslint.config(
  { ignores: ['**/node_modules/**', 'dist/**', '.data/**'] },
  {
    basePath: root,
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.recommended],
    languageOptions: {
      parserOptions: {
        project: ['./shared', './server', './src', './fixtures', './tests'].map(
          (folder) => `${folder}/tsconfig.json`,
        ),
        tsconfigRootDir: root,
      },
    },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      'no-restricted-syntax': ['error', noDefaultExport, noEnvironment],
    },
  },
  {
    basePath: root,
    files: ['shared/**/*.ts', 'fixtures/**/*.ts'],
    rules: { 'no-restricted-syntax': ['error', noDefaultExport, noEnvironment, ...noHiddenInputs] },
  },
  {
    basePath: root,
    files: ['server/config/**/*.ts', 'server/cli/**/*.ts', 'tests/**/*.ts', 'tests/**/*.tsx'],
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
