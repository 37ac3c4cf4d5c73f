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
const noBarrel = {
  selector: 'ExportAllDeclaration',
  message: 'No barrels: import the file that defines the thing.',
};
/** What the mapper lets through and the product must not: each is a way to write or read the wrong row. */
const mapperTraps = [
  {
    selector: "CallExpression[callee.property.name='save']",
    message: 'save() overwrites whichever row its id names: insert, or update by version.',
  },
  {
    selector:
      "CallExpression[callee.property.name='orWhere']:not(NewExpression[callee.name='Brackets'] CallExpression)",
    message: 'A bare orWhere leaves the desk: put the alternatives into Brackets.',
  },
  {
    selector:
      'CallExpression[callee.property.name=/^find(One)?By(OrFail)?$/] > :not(ObjectExpression, ArrayExpression):last-child',
    message: 'Write the condition out: an empty one finds any row.',
  },
  {
    selector: "CallExpression[callee.property.name='query'] > TemplateLiteral[expressions.length>0]",
    message: 'Values go into parameters.',
  },
  {
    selector:
      "CallExpression[callee.property.name='execute']:has(CallExpression[callee.property.name=/^(delete|update)$/]):not(:has(CallExpression[callee.property.name='where']))",
    message: 'Without where this reaches every row.',
  },
];
const noOwnRepository = {
  selector: 'CallExpression[callee.property.name=/^(getRepository|createQueryBuilder)$/]',
  message: 'A desk’s tables are reached through its DeskScope only.',
};
const mapper = {
  name: 'typeorm',
  allowTypeImports: true,
  allowImportNames: ['Brackets'],
  message: 'The mapper is used in server/database and in entities; a desk’s rows come from its DeskScope.',
};
const routing = {
  name: 'express',
  allowTypeImports: true,
  message: 'Routes are mounted from the contract by server/http/mount-endpoints.ts only.',
};

module.exports = defineConfig([
  globalIgnores(['node_modules', 'dist', 'build', 'var', '.expo', 'expo-env.d.ts', 'coverage']),
  expo,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.recommended],
    plugins: { 'import-x': importX },
    languageOptions: {
      parserOptions: { project: ['tsconfig.json', 'server/tsconfig.json'], tsconfigRootDir: __dirname },
    },
    settings: {
      'import-x/resolver-next': [
        createTypeScriptImportResolver({
          project: ['tsconfig.json', 'server/tsconfig.json'],
          noWarnOnMultipleProjects: true,
        }),
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
      'no-restricted-syntax': ['error', noBarrel],
    },
  },
  {
    // The core computes from its arguments alone.
    files: ['journal/**/*.ts'],
    rules: {
      'no-restricted-properties': ['error', ...clockAndChance],
      'no-restricted-syntax': ['error', noBarrel, noBareDate],
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              regex: '^(?!@/journal/|\\.|decimal\\.js$|jstat$|black-scholes$|temporal-polyfill$)',
              message: 'journal/ imports only decimal.js, jstat, black-scholes and temporal-polyfill.',
            },
          ],
        },
      ],
    },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/runtime/**', 'server/cli/**'],
    rules: {
      'no-restricted-properties': ['error', ...clockAndChance],
      'no-restricted-syntax': ['error', noBarrel, noBareDate, ...mapperTraps, noOwnRepository],
      '@typescript-eslint/no-restricted-imports': ['error', { paths: [mapper, routing] }],
    },
  },
  {
    // The mapper's own room, and the stores of what belongs to no desk or comes before one is chosen.
    files: ['server/{database,account,people,desk}/**/*.ts', 'server/**/*-entity.ts'],
    rules: {
      'no-restricted-syntax': ['error', noBarrel, noBareDate, ...mapperTraps],
    },
  },
  {
    files: ['server/database/**/*.ts', 'server/**/*-entity.ts'],
    rules: { '@typescript-eslint/no-restricted-imports': ['error', { paths: [routing] }] },
  },
  {
    files: ['server/http/**/*.ts', 'server/app.ts'],
    rules: { '@typescript-eslint/no-restricted-imports': ['error', { paths: [mapper] }] },
  },
  {
    files: ['scripts/**', 'tests/**', 'server/**', '*.config.js'],
    languageOptions: { globals: { ...globals.node, ...globals.jest } },
    // For bundled clients; here the environment is the environment.
    rules: { 'expo/no-dynamic-env-var': 'off', 'expo/no-env-var-destructuring': 'off' },
  },
  prettier,
]);
