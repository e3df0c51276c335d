// One project a kind of test: unit and outside are pure, components run on a DOM without layout, api meets a real
// MariaDB, e2e drives the built product in Chromium.
const transform = { '^.+\\.m?[tj]sx?$': '<rootDir>/esbuild-jest.cjs', '^.+\\.(png|ttf|woff2|svg)$': '<rootDir>/tests/setup/asset.cjs' };
const alias = { '^@/(.*)$': '<rootDir>/$1' };

// Packages that ship ES modules only.
const esm = [
  'd3-[a-z-]+', 'internmap', 'delaunator', 'robust-predicates', 'react-native-svg', 'victory[a-z-]*', 'expo[a-z-]*', '@expo/[a-z-]+', '@react-navigation/[a-z-]+', 'standard-navigation',
  'file-type', 'strtok3', 'token-types', 'uint8array-extras', '@tokenizer/[a-z-]+', '@borewit/[a-z-]+', 'bcryptjs', 'openchemlib', 'fast-check', 'pure-rand', 'umzug', 'emittery',
];
const transformIgnorePatterns = [`/node_modules/(?!(${esm.join('|')})/)`];

const node = (name, more) => ({
  displayName: name,
  testEnvironment: 'node',
  testMatch: [`<rootDir>/tests/${name}/**/*.test.ts`],
  transform,
  transformIgnorePatterns,
  moduleNameMapper: alias,
  moduleFileExtensions: ['ts', 'tsx', 'js', 'mjs', 'cjs', 'json', 'node'],
  modulePathIgnorePatterns: ['<rootDir>/dist', '<rootDir>/build', '<rootDir>/.data'],
  ...more,
});

module.exports = {
  projects: [
    node('unit'),
    node('outside'),
    {
      ...node('components'),
      testEnvironment: 'jsdom',
      testMatch: ['<rootDir>/tests/components/**/*.test.tsx'],
      setupFiles: ['<rootDir>/tests/setup/components.cjs'],
      moduleFileExtensions: ['web.tsx', 'web.ts', 'web.js', 'tsx', 'ts', 'js', 'mjs', 'cjs', 'json', 'node'],
      moduleNameMapper: { ...alias, '^(d3-[a-z-]+|internmap)$': '<rootDir>/node_modules/$1/dist/$1.js', '^react-native$': 'react-native-web' },
    },
    node('api', { globalSetup: '<rootDir>/tests/setup/database.cjs', globalTeardown: '<rootDir>/tests/setup/stop.cjs' }),
    node('e2e', { globalSetup: '<rootDir>/tests/setup/product.cjs', globalTeardown: '<rootDir>/tests/setup/stop.cjs' }),
  ],
  testTimeout: 60_000,
};
