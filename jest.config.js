// One project a layer, so that a run can be narrowed: npx jest --selectProjects lib
// Watch plugins are an option of the whole run, which a project may not have.
const { watchPlugins: _, ...expoWeb } = require('jest-expo/web/jest-preset');

const alias = { '^@/(.*)$': '<rootDir>/$1' };

// d3 ships ES modules only; react-native-web's main field points at ES modules too.
const transformIgnorePatterns = [
  'node_modules/(?!((jest-)?react-native|@react-native(-community)?|react-native-web|expo(nent)?|@expo(nent)?/.*|@expo-google-fonts/.*|expo-.*|@expo/.*|d3-.*|internmap|react-native-svg|react-native-.*|standard-navigation|@react-navigation/.*)/)',
];

const node = (name) => ({
  displayName: name,
  testEnvironment: 'node',
  testMatch: [`<rootDir>/tests/${name}/**/*.test.ts`],
  moduleNameMapper: alias,
  transform: {
    '\\.m?[jt]sx?$': [
      'babel-jest',
      {
        babelrc: false,
        configFile: false,
        presets: [['babel-preset-expo', { reanimated: false, worklets: false }]],
        // Sequelize models declare their fields; the preset alone refuses `declare`.
        plugins: [['@babel/plugin-transform-typescript', { allowDeclareFields: true }]],
      },
    ],
  },
  transformIgnorePatterns,
});

module.exports = {
  projects: [
    node('lib'),
    node('shared'),
    node('published'),
    {
      ...node('server'),
      setupFilesAfterEnv: ['<rootDir>/tests/server/support/patience.ts'],
      globalSetup: '<rootDir>/server/scripts/test-database.mjs',
      globalTeardown: '<rootDir>/server/scripts/test-database-stop.mjs',
    },
    {
      ...node('browser'),
      globalSetup: '<rootDir>/server/scripts/test-browser.mjs',
      globalTeardown: '<rootDir>/server/scripts/test-browser-stop.mjs',
    },
    {
      ...expoWeb,
      displayName: 'ui',
      testMatch: ['<rootDir>/tests/ui/**/*.test.ts?(x)'],
      setupFilesAfterEnv: [...(expoWeb.setupFilesAfterEnv ?? []), '<rootDir>/tests/ui/support/setup.ts'],
      moduleNameMapper: { ...expoWeb.moduleNameMapper, ...alias },
      transform: { '\\.mjs$': 'babel-jest', ...expoWeb.transform },
      transformIgnorePatterns,
    },
  ],
};
