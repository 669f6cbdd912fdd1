const expo = require('eslint-config-expo/flat');
const prettier = require('eslint-config-prettier');

/** The folders are the architecture: imports run one way. Each row says what a folder may not reach. */
const closed = {
  analysis: ['app', 'components', 'hooks', 'constants', 'shared', 'server', 'scripts', 'tests', 'assets'],
  shared: ['app', 'components', 'hooks', 'constants', 'server', 'scripts', 'tests', 'assets'],
  server: ['app', 'components', 'hooks', 'constants', 'tests'],
  constants: ['app', 'components', 'hooks', 'shared', 'server', 'tests'],
  hooks: ['app', 'components', 'server', 'tests'],
  components: ['app', 'server', 'tests'],
  app: ['server', 'tests', 'analysis', 'shared'],
};

const direction = (folder, refused) => ({
  files: [`${folder}/**/*.{ts,tsx}`],
  rules: {
    'no-restricted-imports': [
      'error',
      {
        patterns: [
          {
            regex: `^(@/|(\\.\\./)+)(${refused.join('|')})(/|$)`,
            message: `${folder}/ may not import from there: see DEVELOPERS.md, "Imports run one way".`,
          },
          ...(folder === 'shared'
            ? [{ regex: '^(?!zod$|\\.|@/(shared|analysis)(/|$)).+', message: 'shared/ imports zod and analysis, nothing else.' }]
            : []),
        ],
      },
    ],
  },
});

module.exports = [
  { ignores: ['node_modules/**', 'dist/**', '.data/**', '.expo/**', 'coverage/**', 'expo-env.d.ts'] },
  ...expo,
  prettier,
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': ['error', { 'ts-expect-error': 'allow-with-description', 'ts-ignore': true }],
      '@typescript-eslint/no-non-null-assertion': 'error',
      'max-lines': ['error', { max: 320, skipBlankLines: true }],
      'no-console': 'error',
      // fast-check is read as `fc.record(…)`, as its own documentation writes it.
      'import/no-named-as-default-member': 'off',
    },
  },
  { files: ['*.config.js'], languageOptions: { globals: { __dirname: 'readonly', module: 'writable', require: 'readonly' } } },
  { files: ['app/**/*.tsx'], ignores: ['app/**/_layout.tsx'], rules: { 'max-lines': ['error', { max: 15, skipBlankLines: true }] } },
  { files: ['tests/**/*.{ts,tsx}'], rules: { 'max-lines': 'off' } },
  { files: ['scripts/**', 'server/main.ts', 'tests/support/**'], rules: { 'no-console': 'off' } },
  ...Object.entries(closed).map(([folder, refused]) => direction(folder, refused)),
];
