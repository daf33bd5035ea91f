import tseslint from 'typescript-eslint';
import reactHooks from 'eslint-plugin-react-hooks';

/** Forbids imports by pattern, so that the arrows between the rooms point one way. */
const arrows = (patterns) => ({
  'no-restricted-imports': ['error', { patterns: patterns.map(([regex, message]) => ({ regex, message })) }],
});

export default tseslint.config(
  { ignores: ['dist', '.data', 'node_modules', 'coverage'] },
  ...tseslint.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      eqeqeq: 'error',
      'no-console': 'error',
      'max-lines': ['error', { max: 350, skipBlankLines: false, skipComments: false }],
    },
  },
  { files: ['src/**/*.{ts,tsx}'], plugins: { 'react-hooks': reactHooks }, rules: reactHooks.configs.recommended.rules },
  {
    files: ['shared/**/*.ts'],
    ignores: ['**/*.test.ts', 'shared/assessment/command.ts'],
    rules: {
      ...arrows([
        ['/(server|src|mocks|tests)/', 'shared/ is pure: it knows no server, page, fake or test.'],
        ['^(express|sequelize|mariadb|react|node:)', 'shared/ is pure: no network, database, page or file system.'],
      ]),
      'no-restricted-syntax': [
        'error',
        { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'Time is injected.' },
        { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: 'Time is injected.' },
      ],
    },
  },
  { files: ['src/**/*.{ts,tsx}'], rules: arrows([['/(server|mocks|tests)/', 'Pages import only src/ and shared/.']]) },
  {
    files: ['server/**/*.ts'],
    ignores: ['**/*.test.ts', 'server/clock/**'],
    rules: {
      ...arrows([['/(src|tests)/', 'The server imports only server/ and shared/ (mocks/ through server/demo.ts).']]),
      'no-restricted-syntax': [
        'error',
        { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'Take the time from server/clock.' },
        { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: 'Take the time from server/clock.' },
      ],
    },
  },
  { files: ['server/delivery/**/*.ts'], rules: arrows([['/(forecasts|assessment)/', 'Delivery knows nothing of weather.']]) },
  { files: ['server/forecasts/**/*.ts'], rules: arrows([['/(notices|delivery)/', 'Forecasts know nothing of notices.']]) },
  { files: ['server/setup/**', 'tests/run.mjs', 'tests/bench/**', '**/*command.ts'], rules: { 'no-console': 'off' } },
);
