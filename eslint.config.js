const { defineConfig, globalIgnores } = require('eslint/config');
const expo = require('eslint-config-expo/flat');
const importX = require('eslint-plugin-import-x');
const { createTypeScriptImportResolver } = require('eslint-import-resolver-typescript');
const prettier = require('eslint-config-prettier');
const globals = require('globals');
const tseslint = require('typescript-eslint');

const room = (name) => `./${name}`;
const rooms = ['app', 'components', 'hooks', 'journal', 'shared', 'server', 'assets', 'scripts'];
/** What each room may import of ours; everything else is refused. Tests may import everything. */
const mayImport = {
  app: ['components', 'hooks', 'shared', 'assets'],
  components: ['hooks', 'shared', 'journal', 'assets'],
  hooks: ['shared', 'journal'],
  journal: [],
  shared: ['journal'],
  server: ['shared', 'journal'],
  assets: [],
};
const zones = Object.entries(mayImport).map(([name, allowed]) => ({
  target: room(name),
  from: [...rooms.filter((other) => other !== name && !allowed.includes(other)), 'tests'].map(room),
  message: `${name}/ may import only from: ${allowed.join(', ') || 'nothing of ours'}.`,
}));

const clockAndChance = [
  { object: 'Date', property: 'now', message: 'Pass a clock in.' },
  { object: 'Math', property: 'random', message: 'Pass a seeded source in.' },
];
const noBareDate = {
  selector: "NewExpression[callee.name='Date'][arguments.length=0]",
  message: 'Pass a clock in.',
};

module.exports = defineConfig([
  globalIgnores(['node_modules', 'dist', 'build', 'var', '.expo', 'expo-env.d.ts', 'coverage']),
  expo,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.recommended],
    plugins: { 'import-x': importX },
    languageOptions: { parserOptions: { project: ['tsconfig.json', 'server/tsconfig.json'], tsconfigRootDir: __dirname } },
    settings: {
      'import-x/resolver-next': [
        createTypeScriptImportResolver({ project: ['tsconfig.json', 'server/tsconfig.json'], noWarnOnMultipleProjects: true }),
      ],
    },
    rules: {
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': 'error',
      // fast-check is used as `fc` by custom; a type and the value it describes may share a name.
      'import/no-named-as-default-member': 'off',
      '@typescript-eslint/no-redeclare': 'off',
      'no-restricted-syntax': ['error', { selector: 'ExportAllDeclaration', message: 'No barrels: import the file that defines the thing.' }],
    },
  },
  {
    // The core computes from its arguments alone.
    files: ['journal/**/*.ts'],
    rules: {
      'no-restricted-properties': ['error', ...clockAndChance],
      'no-restricted-syntax': ['error', noBareDate],
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^(?!@/journal/|\\.|decimal\\.js$|jstat$|black-scholes$|temporal-polyfill$)', message: 'journal/ imports only decimal.js, jstat, black-scholes and temporal-polyfill.' }] },
      ],
    },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/runtime/**', 'server/cli/**'],
    rules: {
      'no-restricted-properties': ['error', ...clockAndChance],
      'no-restricted-syntax': ['error', noBareDate],
    },
  },
  {
    files: ['scripts/**', 'tests/**', 'server/**', '*.config.js'],
    languageOptions: { globals: { ...globals.node, ...globals.jest } },
  },
  prettier,
]);
