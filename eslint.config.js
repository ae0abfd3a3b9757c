import js from '@eslint/js';
import hooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import ts from 'typescript-eslint';

/** Rooms that a folder may not look into. */
const closedTo = (...rooms) => ({
  'no-restricted-imports': [
    'error',
    {
      patterns: rooms.map((room) => ({
        group: [`#${room}/**`],
        message: `Not from here: see DEVELOPERS.md.`,
      })),
    },
  ],
});

export default ts.config(
  { files: ['**/*.cjs'], languageOptions: { globals: globals.node } },
  { ignores: ['dist', 'node_modules', '.cache'] },
  js.configs.recommended,
  ...ts.configs.strict,
  {
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/no-invalid-void-type': 'off',
      '@typescript-eslint/no-dynamic-delete': 'off',
      eqeqeq: 'error',
      'no-console': 'error',
      'max-lines': ['error', { max: 350, skipComments: true, skipBlankLines: true }],
    },
  },
  { files: ['shared/**'], rules: closedTo('server', 'src', 'tests') },
  { files: ['server/**'], languageOptions: { globals: globals.node }, rules: closedTo('src', 'tests') },
  { files: ['server/bin/**', 'tests/bench/**', 'tests/setup/**'], rules: { 'no-console': 'off' } },
  {
    files: ['src/**'],
    languageOptions: { globals: globals.browser },
    plugins: { 'react-hooks': hooks },
    rules: {
      ...hooks.configs['recommended-latest'].rules,
      // Concerns the React compiler only, which is not used here.
      'react-hooks/incompatible-library': 'off',
      ...closedTo('server', 'tests'),
    },
  },
  {
    files: ['src/components/**', 'src/lib/**', 'src/drawings/**'],
    rules: closedTo('server', 'tests', 'src/features', 'src/routes', 'src/app'),
  },
  { files: ['src/features/**'], rules: closedTo('server', 'tests', 'src/routes', 'src/app') },
  {
    files: ['src/**/*.test.*', 'shared/**/*.test.ts', 'server/**/*.test.ts'],
    rules: { 'no-restricted-imports': 'off' },
  },
  {
    files: ['tests/**', '**/*.test.ts'],
    languageOptions: { globals: globals.node },
    rules: { 'max-lines': 'off' },
  },
);
