// One-way imports: src -> shared <- server -> db -> shared. zod stays in the contract and where the environment is read.
import eslint from '@eslint/js';
import angular from 'angular-eslint';
import tseslint from 'typescript-eslint';

/** Forbids imports of the named top folders, by alias and by relative path. */
function mayNotImport(folders, more = []) {
  return {
    'no-restricted-imports': [
      'error',
      {
        patterns: [
          ...folders.map((folder) => ({
            regex: `^#${folder}/|^(\\.\\./)+${folder}(/|$)`,
            message: `Imports go one way: src -> shared <- server -> db -> shared. ${folder}/ is not for this folder.`,
          })),
          ...more,
        ],
      },
    ],
  };
}
const noZod = { regex: '^zod', message: 'The pure core knows no schema library; schemas live in shared/contract.' };

export default tseslint.config(
  { ignores: ['dist/', 'data/', '.angular/', 'node_modules/', 'db/migrations/', 'test-results/'] },
  {
    files: ['**/*.{js,mjs}'],
    extends: [eslint.configs.recommended],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        fetch: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        AbortSignal: 'readonly',
      },
    },
  },
  { files: ['public/**/*.js'], languageOptions: { globals: { document: 'readonly', localStorage: 'readonly' } } },
  {
    files: ['**/*.ts'],
    extends: [eslint.configs.recommended, ...tseslint.configs.strict, ...tseslint.configs.stylistic],
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
      '@typescript-eslint/consistent-type-definitions': 'off',
      'no-console': 'error',
      eqeqeq: 'error',
    },
  },
  {
    files: ['src/**/*.ts'],
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      ...mayNotImport(['server', 'db']),
      '@angular-eslint/directive-selector': ['error', { type: 'attribute', prefix: 'qr', style: 'camelCase' }],
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'qr', style: 'kebab-case' }],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
    },
  },
  {
    files: ['src/**/*.html'],
    extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility],
  },
  { files: ['shared/**/*.ts'], rules: mayNotImport(['src', 'server', 'db'], [noZod]) },
  { files: ['shared/contract/**/*.ts'], rules: mayNotImport(['src', 'server', 'db']) },
  { files: ['db/**/*.ts'], rules: mayNotImport(['src', 'server']) },
  { files: ['server/**/*.ts'], rules: mayNotImport(['src']) },
);
