const boundaries = require('eslint-plugin-boundaries');
const expo = require('eslint-config-expo/flat');
const { defineConfig, globalIgnores } = require('eslint/config');

const code = '**/*.{ts,tsx}';
const layers = ['app', 'components', 'lib', 'shared', 'server', 'tests'];

/** Who may import whom, type imports included; what is not listed is forbidden. */
const walls = {
  app: ['app', 'components', 'shared', 'lib'],
  components: ['components', 'shared', 'lib'],
  server: ['server', 'shared', 'lib'],
  shared: ['shared'],
  lib: ['lib'],
  tests: ['tests', 'app', 'components', 'lib', 'shared', 'server'],
};

/** Packages that a layer may import; all others are forbidden to it. */
const onlyPackages = (names, message) => ({
  'no-restricted-imports': ['error', { patterns: [{ regex: `^(?!\\.|@/|(${names.join('|')})(/|$))`, message }] }],
});

const impure = [
  'window',
  'document',
  'process',
  'fetch',
  'Date',
  'performance',
  'crypto',
  'setTimeout',
  'setInterval',
  'localStorage',
];

const colour = '/^(#[0-9a-fA-F]{3,8}|(rgb|hsl)a?\\(.*)$/';
const sizes =
  '/^(fontSize|lineHeight|letterSpacing|gap|rowGap|columnGap|border(Top|Right|Bottom|Left)?(Width|Radius)|(padding|margin)(Top|Right|Bottom|Left|Horizontal|Vertical)?)$/';

const positionalBoolean = {
  selector: ':function[params.length>1] > Identifier[typeAnnotation.typeAnnotation.type="TSBooleanKeyword"]',
  message: 'A boolean among other parameters says nothing where it is called: take an options object.',
};

/* global __dirname */
module.exports = defineConfig([
  globalIgnores(['dist/**', 'dist.new/**', 'node_modules/**', '.rowcall/**', '.expo/**', 'public/**', 'coverage/**']),
  expo,
  {
    files: [code],
    plugins: { boundaries },
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: __dirname } },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    settings: {
      'import/resolver': { typescript: { project: './tsconfig.json' } },
      'boundaries/elements': layers.map((type) => ({ type, partialMatch: false, pattern: `${type}/**/*` })),
    },
    rules: {
      'boundaries/dependencies': [
        'error',
        {
          default: 'disallow',
          message: '{{ from.element.type }} may not import {{ to.element.type }}.',
          policies: [
            { allow: { to: { module: { origin: ['external', 'core'] } } } },
            ...Object.entries(walls).map(([from, to]) => ({
              from: { element: { type: from } },
              allow: { to: { element: { types: { anyOf: to } } } },
            })),
            {
              from: { element: { type: 'lib' } },
              allow: { to: { element: { type: 'shared' } }, dependency: { kind: 'type' } },
            },
          ],
        },
      ],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/consistent-type-imports': ['error', { disallowTypeAnnotations: false }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { ignoreRestSiblings: true, argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
      ],
      'import/no-default-export': 'error',
      // TypeScript knows these better.
      'import/named': 'off',
      'import/namespace': 'off',
      'import/no-unresolved': 'off',
      'import/no-named-as-default': 'off',
      'import/no-named-as-default-member': 'off',
      'no-console': 'error',
      eqeqeq: 'error',
      'no-restricted-syntax': ['error', positionalBoolean],
      'max-lines': ['warn', { max: 300, skipBlankLines: true, skipComments: true }],
      'max-lines-per-function': ['warn', { max: 80, skipBlankLines: true, skipComments: true }],
      'max-params': ['warn', 3],
    },
  },
  {
    files: ['lib/**/*.ts'],
    rules: {
      ...onlyPackages(['d3-array'], 'lib is pure: itself, d3-array and the types of shared.'),
      'no-restricted-globals': ['error', ...impure.map((name) => ({ name, message: 'lib is pure: it is passed in.' }))],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'lib is pure: chance is passed in.' },
      ],
    },
  },
  { files: ['shared/**/*.ts'], rules: onlyPackages(['zod'], 'shared is what both sides agree on: zod alone.') },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/models/**', 'server/services/**', 'server/migrations/**'],
    rules: {
      'no-restricted-imports': [
        'error',
        { paths: [{ name: 'sequelize', message: 'Only models and services speak to the database.' }] },
      ],
    },
  },
  {
    files: ['app/**/*.{ts,tsx}', 'components/**/*.{ts,tsx}'],
    rules: { 'max-lines-per-function': ['warn', { max: 110, skipBlankLines: true, skipComments: true }] },
  },
  {
    files: ['app/**/*.{ts,tsx}', 'components/**/*.{ts,tsx}'],
    ignores: ['components/theme/**'],
    rules: {
      'no-restricted-syntax': [
        'error',
        positionalBoolean,
        { selector: `Literal[value=${colour}]`, message: 'Colours come from the theme.' },
        {
          selector: `Property[key.name=${sizes}] > Literal[value>1]`,
          message: 'Sizes come from the theme.',
        },
      ],
    },
  },
  // A route's file shows its screen as its default export, because Expo Router asks for it.
  { files: ['app/**', '**/*.d.ts'], rules: { 'import/no-default-export': 'off' } },
  {
    files: ['tests/**'],
    rules: { 'max-lines': 'off', 'max-lines-per-function': 'off' },
  },
  // What runs before there are packages speaks to the terminal, and Jest asks for default exports.
  {
    files: ['server/scripts/**/*.mjs'],
    rules: { 'expo/no-env-var-destructuring': 'off' },
    languageOptions: {
      globals: { process: 'readonly', Buffer: 'readonly', setTimeout: 'readonly', setInterval: 'readonly' },
    },
  },
]);
