import { fileURLToPath } from 'node:url';
import { defineConfig } from 'eslint/config';
import tseslint from 'typescript-eslint';

const root = fileURLToPath(new URL('..', import.meta.url));

/** State belongs to what `main` builds; a module-level `let` is state nobody handed in. */
const noModuleState = {
  selector:
    ':matches(Program, Program > ExportNamedDeclaration) > VariableDeclaration[kind=/^(let|var)$/]',
  message: 'No module-level state: build it in main and hand it in.',
};
const noDefaultExport = {
  selector: 'ExportDefaultDeclaration',
  message: 'Export by name, so that one thing has one name everywhere.',
};
const noSkippedTest = {
  selector:
    'MemberExpression[object.name=/^(test|it|describe)$/][property.name!=/^(each|for|concurrent|sequential|extend)$/]',
  message: 'Every test runs every time and may fail.',
};

export default defineConfig(
  { ignores: ['dist/', 'coverage/', 'node_modules/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  {
    files: ['**/*.{ts,js,mjs}'],
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: {
      parserOptions: { project: '.config/tsconfig.test.json', tsconfigRootDir: root },
    },
    rules: {
      eqeqeq: 'error',
      'no-var': 'error',
      'prefer-const': 'error',
      'no-restricted-syntax': ['error', noModuleState],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
    },
  },
  {
    files: ['src/**/*.ts', 'commands/**/*.ts'],
    rules: { 'no-restricted-syntax': ['error', noModuleState, noDefaultExport] },
  },
  {
    files: ['test/**/*.ts'],
    rules: {
      'no-restricted-syntax': ['error', noModuleState, noDefaultExport, noSkippedTest],
      '@typescript-eslint/no-non-null-assertion': 'off',
    },
  },
);
