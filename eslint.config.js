import { defineConfig, globalIgnores } from 'eslint/config';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** Legal ECMAScript that reads the clock or rolls dice; the compiler cannot forbid it, so the linter does. */
const impureInDomain = [
  {
    selector: "MemberExpression[object.name='Date'][property.name='now']",
    message: 'The core takes the time as an argument.',
  },
  {
    selector: "NewExpression[callee.name='Date'][arguments.length=0]",
    message: 'The core takes the time as an argument: new Date() reads the clock.',
  },
  {
    selector: "CallExpression[callee.name='Date']",
    message: 'The core takes the time as an argument: Date() reads the clock.',
  },
  {
    selector: "MemberExpression[object.name='Math'][property.name='random']",
    message: 'The core takes identifiers and choices as arguments.',
  },
];

const noEnum = {
  selector: 'TSEnumDeclaration',
  message: 'A closed set is a union of texts: it crosses the wire and the database as it is.',
};

export default defineConfig([
  globalIgnores(['dist/', '.local/', '.tsc/', 'coverage/']),
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  {
    files: ['**/*.{ts,tsx,js,mjs,cjs}'],
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      eqeqeq: 'error',
      'no-restricted-syntax': ['error', noEnum],
      '@typescript-eslint/consistent-type-definitions': ['error', 'type'],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  { files: ['**/*.cjs'], rules: { '@typescript-eslint/no-require-imports': 'off' } },
  { files: ['src/domain/**/*.ts'], rules: { 'no-restricted-syntax': ['error', noEnum, ...impureInDomain] } },
  { files: ['src/**/*.{ts,tsx}'], ...reactHooks.configs.flat['recommended-latest'] },
  {
    // A declaration that widens a library's own interface has to be an interface itself.
    files: ['**/*.d.ts'],
    rules: { '@typescript-eslint/consistent-type-definitions': 'off' },
  },
]);
