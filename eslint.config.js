import vue from 'eslint-plugin-vue';
import tseslint from 'typescript-eslint';
import vueParser from 'vue-eslint-parser';
import { importLayers } from './server/scripts/lint/importLayers.mjs';

const noClock = [
  {
    selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    message: 'The clock is handed in.',
  },
  { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'The clock is handed in.' },
];
const noEnvironment = [
  {
    selector: "MemberExpression[object.name='process'][property.name='env']",
    message: 'Only the settings (server/config.ts and the scripts) read the environment.',
  },
];
const noDefaultExport = [
  {
    selector: 'ExportDefaultDeclaration',
    message: 'Export by name; default exports are for tools that want one.',
  },
];
const noArithmetic = [
  {
    selector: 'BinaryExpression[operator=/^([*%/]|\\*\\*)$/]',
    message: 'A view holds no arithmetic: ask a composable or the shared mathematics.',
  },
];
const honestTests = [
  {
    selector:
      'MemberExpression[object.name=/^(it|test|describe)$/][property.name=/^(skip|only|todo|fails)$/]',
    message: 'Every test runs.',
  },
  {
    selector: 'CallExpression[callee.property.name=/Snapshot$/]',
    message: 'Say what a user would notice; no snapshots.',
  },
];
const restrict = (...lists) => ({ 'no-restricted-syntax': ['error', ...lists.flat()] });

const correctness = Object.fromEntries(
  [
    'eqeqeq',
    'no-cond-assign',
    'no-console',
    'no-constant-binary-expression',
    'no-constant-condition',
    'no-control-regex',
    'no-debugger',
    'no-else-return',
    'no-empty',
    'no-irregular-whitespace',
    'no-loss-of-precision',
    'no-param-reassign',
    'no-self-assign',
    'no-self-compare',
    'no-sparse-arrays',
    'no-template-curly-in-string',
    'no-unmodified-loop-condition',
    'no-unreachable-loop',
    'no-unsafe-finally',
    'no-unsafe-optional-chaining',
    'no-useless-catch',
    'no-useless-escape',
    'no-useless-rename',
    'no-useless-return',
    'no-var',
    'object-shorthand',
    'prefer-const',
    'prefer-object-has-own',
    'use-isnan',
  ].map((rule) => [rule, 'error']),
);

/** Rules that need types; the forgotten await is what they are for. */
const typed = Object.fromEntries(
  [
    'await-thenable',
    'no-array-delete',
    'no-base-to-string',
    'no-floating-promises',
    'no-for-in-array',
    'no-implied-eval',
    'no-misused-promises',
    'only-throw-error',
    'prefer-promise-reject-errors',
    'no-unsafe-argument',
    'no-unsafe-assignment',
    'no-unsafe-call',
    'no-unsafe-return',
  ].map((rule) => [`@typescript-eslint/${rule}`, 'error']),
);

export default tseslint.config(
  { ignores: ['node_modules/', '.data/', 'openapi/'] },
  {
    // A rule that is wrong somewhere is changed here, in the open.
    linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: 'error' },
    plugins: { evenfall: { rules: { 'import-layers': importLayers } } },
    rules: { 'evenfall/import-layers': 'error' },
  },
  ...tseslint.configs.strict,
  ...vue.configs['flat/essential'],
  {
    rules: {
      ...correctness,
      '@typescript-eslint/consistent-type-imports': [
        'error',
        { fixStyle: 'inline-type-imports', disallowTypeAnnotations: true },
      ],
      '@typescript-eslint/no-dynamic-delete': 'off',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
      'max-lines': ['error', 300],
      'max-lines-per-function': [
        'error',
        { max: 70, skipComments: true, skipBlankLines: true, IIFEs: false },
      ],
    },
  },
  {
    files: ['**/*.ts'],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      ...typed,
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
    },
  },
  {
    files: ['**/*.vue'],
    languageOptions: { parser: vueParser, parserOptions: { parser: tseslint.parser } },
    rules: {
      'vue/block-lang': ['error', { script: { lang: 'ts' } }],
      'vue/component-api-style': ['error', ['script-setup']],
      'vue/define-emits-declaration': ['error', 'type-literal'],
      'vue/define-props-declaration': ['error', 'type-based'],
      'vue/multi-word-component-names': ['error', { ignores: ['App'] }],
      'vue/no-unused-refs': 'error',
      'vue/no-v-html': 'error',
      'vue/require-typed-ref': 'error',
    },
  },
  {
    // Pure: what the language itself has, and nothing of Node's or the browser's.
    files: ['shared/**/*.ts'],
    languageOptions: { globals: {}, parserOptions: { lib: ['es2023'] } },
    rules: {
      'no-undef': 'error',
      'no-restricted-globals': ['error', 'globalThis'],
      ...restrict(noClock, noEnvironment, noDefaultExport),
    },
  },
  { files: ['server/**/*.ts'], rules: restrict(noClock, noEnvironment, noDefaultExport) },
  { files: ['server/main.ts'], rules: restrict(noEnvironment, noDefaultExport) },
  { files: ['server/scripts/**'], rules: restrict(noDefaultExport) },
  {
    files: ['src/**'],
    rules: { ...restrict(noClock, noDefaultExport), 'no-console': ['error', { allow: ['warn', 'error'] }] },
  },
  { files: ['src/composables/clock.ts'], rules: restrict(noDefaultExport) },
  {
    files: ['src/views/**'],
    rules: {
      ...restrict(noClock, noDefaultExport, noArithmetic),
      'vue/no-restricted-syntax': ['error', ...noArithmetic],
      'no-restricted-globals': [
        'error',
        { name: 'fetch', message: 'A view fetches nothing: ask a store or a composable.' },
      ],
    },
  },
  {
    files: ['tests/**'],
    rules: {
      ...restrict(honestTests, noEnvironment, noDefaultExport),
      'max-lines-per-function': 'off',
      'no-console': 'off',
    },
  },
  {
    // Assertions of matchers and answers of a server are of any type until they are looked at.
    files: ['tests/**/*.ts'],
    rules: Object.fromEntries(
      ['argument', 'assignment', 'call', 'return'].map((what) => [
        `@typescript-eslint/no-unsafe-${what}`,
        'off',
      ]),
    ),
  },
  { files: ['tests/support/**'], rules: restrict(honestTests) },
  // The examples are programs of their own and get an environment.
  { files: ['tests/examples/**'], rules: restrict(honestTests, noDefaultExport) },
  { files: ['examples/**', 'tests/bench/**'], rules: { 'no-console': 'off' } },
  {
    files: ['**/*.config.{ts,js}'],
    rules: { 'no-restricted-syntax': 'off', '@typescript-eslint/consistent-type-imports': 'off' },
  },
  // Descriptions of what others wrote.
  {
    files: ['**/*.d.{ts,mts}'],
    rules: { 'no-restricted-syntax': 'off', '@typescript-eslint/no-extraneous-class': 'off' },
  },
);
