import js from '@eslint/js';
import globals from 'globals';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** `shared/` is pure: chance and time are passed in, so that the same parameters give the same samples. */
const pureCode = {
  files: ['shared/**/*.ts'],
  rules: {
    'no-restricted-properties': [
      'error',
      { object: 'Math', property: 'random', message: 'Pass a seeded random stream in.' },
      { object: 'Date', property: 'now', message: 'Pass the time in.' },
      { object: 'performance', property: 'now', message: 'Pass the time in.' },
    ],
    'no-restricted-syntax': [
      'error',
      { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'Pass the time in.' },
    ],
    'no-restricted-globals': ['error', 'process', 'window', 'document', 'console', 'performance'],
  },
};

export default tseslint.config(
  { ignores: ['node_modules/', 'dist/', 'data/', 'output/', 'coverage/'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  {
    languageOptions: { globals: globals.node },
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      'max-lines': ['error', { max: 400, skipBlankLines: true, skipComments: true }],
      eqeqeq: 'error',
    },
  },
  { files: ['**/*.cjs'], languageOptions: { sourceType: 'commonjs' } },
  {
    files: ['src/**/*.{ts,tsx}'],
    languageOptions: { globals: globals.browser },
    plugins: { 'react-hooks': reactHooks },
    rules: reactHooks.configs.recommended.rules,
  },
  pureCode,
);
