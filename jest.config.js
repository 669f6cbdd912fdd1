// Every project but the components' runs on plain Node; only the drawn parts need jest-expo's web preset.
const node = (name, ...folders) => ({
  displayName: name,
  rootDir: __dirname,
  testEnvironment: 'node',
  testMatch: folders.map((folder) => `<rootDir>/tests/${folder}/**/*.test.{ts,tsx}`),
  transform: {
    '\\.[cm]?[jt]sx?$': ['babel-jest', { configFile: false, presets: [['babel-preset-expo', { reactCompiler: false }]] }],
  },
  transformIgnorePatterns: [
    '/node_modules/(?!(ml-|is-any-array|uuid|simple-statistics|fast-check|pure-rand|@stdlib|idb|typeorm|zod))',
  ],
  moduleNameMapper: { '^@/(.*)$': '<rootDir>/$1' },
});

module.exports = {
  testTimeout: 30_000,
  projects: [
    node('analysis', 'analysis'),
    node('shared', 'shared'),
    node('scripts', 'scripts'),
    { ...node('server', 'server'), globalSetup: '<rootDir>/tests/support/migrated-template.ts' },
    {
      displayName: 'components',
      preset: 'jest-expo/web',
      rootDir: __dirname,
      testMatch: ['<rootDir>/tests/{components,hooks}/**/*.test.{ts,tsx}'],
      setupFilesAfterEnv: ['@testing-library/jest-dom'],
      transformIgnorePatterns: [
        '/node_modules/(?!((jest-)?react-native|@react-native|expo|@expo|victory-|d3-|internmap|delaunator|robust-predicates|is-any-array|ml-|standard-navigation|react-navigation|@react-navigation|uuid|idb|simple-statistics))',
      ],
      moduleNameMapper: { '^@/(.*)$': '<rootDir>/$1' },
    },
    { ...node('browser', 'browser'), globalSetup: '<rootDir>/tests/support/running-product.ts' },
  ],
};
