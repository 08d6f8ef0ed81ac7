import js from '@eslint/js';
import angular from 'angular-eslint';
import { defineConfig, globalIgnores } from 'eslint/config';
import prettier from 'eslint-config-prettier/flat';
import tseslint from 'typescript-eslint';

/** What the security rules of the house forbid in every TypeScript file. */
const forbiddenSyntax = [
  {
    selector: 'MemberExpression[property.name=/^(innerHTML|outerHTML|insertAdjacentHTML)$/]',
    message: 'Markup from text opens the page to injection: bind text instead.',
  },
  {
    selector: 'Identifier[name=/^bypassSecurityTrust/]',
    message: 'The sanitizer stays on.',
  },
  {
    selector: 'CallExpression[callee.object.name="sql"][callee.property.name=/^(raw|lit)$/]',
    message: 'Bind values, and name columns through sql.ref or an allow list.',
  },
];

const unfinishedSpecs = [
  {
    selector: 'CallExpression[callee.name=/^(fdescribe|xdescribe|xit|pending)$/]',
    message: 'A focused or skipped spec proves nothing.',
  },
  {
    // A call of our own function named fit does not begin with a title.
    selector:
      'CallExpression[callee.name="fit"]:matches([arguments.0.raw=/^[\'"]/], [arguments.0.type="TemplateLiteral"])',
    message: 'A focused spec hides the others.',
  },
  {
    selector:
      'CallExpression[callee.object.name=/^(test|it|describe)$/][callee.property.name=/^(only|skip|fixme)$/]',
    message: 'A focused or skipped spec proves nothing.',
  },
  {
    selector:
      'CallExpression[callee.object.property.name="describe"][callee.property.name=/^(only|skip|fixme)$/]',
    message: 'A focused or skipped spec proves nothing.',
  },
];

const noChance = {
  object: 'Math',
  property: 'random',
  message: 'Secrets come from node:crypto, and draws of the engine from its seeded generator.',
};

export default defineConfig(
  globalIgnores([
    'dist/',
    '.angular/',
    '.kinvale/',
    'coverage/',
    'test-results/',
    'playwright-report/',
    'backend/stats/golden/',
  ]),
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  {
    files: ['**/*.ts'],
    extends: [
      js.configs.recommended,
      tseslint.configs.strictTypeChecked,
      tseslint.configs.stylisticTypeChecked,
      prettier,
    ],
    languageOptions: {
      parserOptions: {
        project: ['tsconfig.spec.json', 'tsconfig.node.json', 'e2e/tsconfig.json'],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      'no-restricted-syntax': ['error', ...forbiddenSyntax],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/prefer-readonly': 'error',
      // Numbers in messages read well; objects and undefined in them are still mistakes.
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      // Plain loops over typed arrays are the house style of the engine; the index is data there.
      '@typescript-eslint/prefer-for-of': 'off',
      // An Angular component without members, and a service that only holds its constructor, are fine.
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      // Express calls back and ignores what comes: it awaits a returned promise by itself.
      '@typescript-eslint/no-misused-promises': [
        'error',
        { checksVoidReturn: { arguments: false, attributes: false } },
      ],
      // `() => store.save()` as a handler is the clearest way to write it.
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      // With noUncheckedIndexedAccess off, a check of an indexed value is needed and looks needless to the rule.
      '@typescript-eslint/no-unnecessary-condition': 'off',
      // Angular's Validators and jasmine's matchers are made to be handed on unbound.
      '@typescript-eslint/unbound-method': ['error', { ignoreStatic: true }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      // The house forbids index signatures by dot (compiler option), so the bracket form is wanted.
      '@typescript-eslint/dot-notation': ['error', { allowIndexSignaturePropertyAccess: true }],
      // Material's configurations are classes, and object literals fill them everywhere.
      '@typescript-eslint/no-unsafe-class-instance-assignment': 'off',
      // Type parameters that occur once document a promise, as in Repositories.transaction<Result>.
      '@typescript-eslint/no-unnecessary-type-parameters': 'off',
    },
  },
  {
    files: ['src/**/*.ts'],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-signals': 'error',
    },
  },
  {
    files: ['src/main.ts', 'tools/**/*.ts', 'stubs/**/*.ts', 'backend/migrate-main.ts'],
    rules: { 'no-console': 'off' }, // what they print is for the person who started them
  },
  {
    files: ['backend/**/*.ts', 'db/**/*.ts'],
    rules: { 'no-restricted-properties': ['error', noChance] },
  },
  {
    files: ['**/*.spec.ts', 'e2e/**/*.ts'],
    rules: {
      'no-restricted-syntax': ['error', ...forbiddenSyntax, ...unfinishedSpecs],
      // A spec knows what it put in; a wrong guess fails the spec, which is its job.
      '@typescript-eslint/no-non-null-assertion': 'off',
      // Replies of supertest are any; what a spec expects of them is checked at run time.
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
    },
  },
  {
    files: ['src/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: ':matches(BoundAttribute, TextAttribute)[name=/^(innerHTML|outerHTML)$/]',
          message: 'Markup from text opens the page to injection: bind text instead.',
        },
      ],
    },
  },
  {
    files: ['**/*.{js,mjs,cjs}'],
    extends: [js.configs.recommended, prettier],
    languageOptions: {
      globals: {
        ...Object.fromEntries(
          [
            'process',
            'console',
            'URL',
            'AbortController',
            'AbortSignal',
            'setTimeout',
            'clearTimeout',
          ].map((name) => [name, 'readonly']),
        ),
      },
    },
    rules: { 'no-restricted-syntax': ['error', ...forbiddenSyntax] },
  },
  {
    files: ['**/*.cjs'],
    languageOptions: {
      sourceType: 'commonjs',
      globals: { require: 'readonly', module: 'writable', process: 'readonly' },
    },
  },
  {
    files: ['**/*.spec.mjs'],
    languageOptions: {
      globals: Object.fromEntries(
        ['describe', 'it', 'expect', 'beforeEach', 'afterEach'].map((name) => [name, 'readonly']),
      ),
    },
    rules: { 'no-restricted-syntax': ['error', ...forbiddenSyntax, ...unfinishedSpecs] },
  },
);
