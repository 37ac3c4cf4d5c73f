const expoWeb = require('jest-expo/web/jest-preset.js');

const transformNode = {
  '(\\.tsx?|\\.mjs|(canonicalize|temporal-polyfill|temporal-utils)/.*\\.js)$': [
    '@swc/jest',
    {
      jsc: {
        target: 'es2022',
        parser: { syntax: 'typescript', decorators: true },
        transform: { legacyDecorator: true, decoratorMetadata: false, useDefineForClassFields: false },
      },
      module: { type: 'commonjs' },
      sourceMaps: 'inline',
    },
  ],
};
// d3 ships ES modules as its main entry; jest gets the UMD builds that lie beside them.
const d3 = { '^(d3-[a-z-]+|internmap)$': '<rootDir>/node_modules/$1/dist/$1.js' };
const alias = { '^@/(.*)$': '<rootDir>/$1' };
const node = {
  testEnvironment: 'node',
  transform: transformNode,
  // These ship ES modules only.
  transformIgnorePatterns: ['/node_modules/(?!(canonicalize|temporal-polyfill|temporal-utils)/)'],
  moduleNameMapper: { ...alias, '^canonicalize$': '<rootDir>/node_modules/canonicalize/lib/canonicalize.js' },
};

/** @type {import('jest').Config} */
module.exports = {
  projects: [
    { ...node, displayName: 'engine', testMatch: ['<rootDir>/tests/{journal,shared,reference,scripts}/**/*.test.ts'] },
    { ...node, displayName: 'server', testMatch: ['<rootDir>/tests/server/**/*.test.ts'] },
    { ...node, displayName: 'e2e', testMatch: ['<rootDir>/tests/e2e/**/*.test.ts'] },
    {
      preset: 'jest-expo/web',
      displayName: 'ui',
      // The preset's own list, with those that ship ES modules only.
      transformIgnorePatterns: expoWeb.transformIgnorePatterns.map((pattern) =>
        pattern.replace('(?!(', '(?!(canonicalize|temporal-polyfill|temporal-utils|'),
      ),
      testMatch: ['<rootDir>/tests/{app,components,hooks}/**/*.test.{ts,tsx}'],
      moduleNameMapper: {
        ...d3,
        '\\.(woff2|svg)$': '<rootDir>/tests/asset-stub.js',
        '^react-native$': 'react-native-web',
        ...alias,
      },
    },
  ],
};
