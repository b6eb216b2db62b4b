import { importX } from 'eslint-plugin-import-x';
import queryPlugin from '@tanstack/eslint-plugin-query';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/** The server's modules, in the order imports may go: a folder imports from those before it, never from those after. */
const serverOrder = ['accounts', 'departments', 'lots', 'plans', 'clearances', 'visits', 'holds', 'outcomes'];
const later = (name) => serverOrder.slice(serverOrder.indexOf(name) + 1);

const zones = [
  ...serverOrder.slice(0, -1).map((name) => ({
    target: `./backend/src/${name}/!(*.spec).ts`,
    from: later(name).map((each) => `./backend/src/${each}/!(*.model|*.queries).ts`),
    message: 'Modules are imported in one direction only: see architecture in DEVELOPERS.md.',
  })),
  {
    target: './backend/src/common',
    from: serverOrder.map((name) => `./backend/src/${name}`),
    message: 'common knows no domain word.',
  },
  {
    target: './shared-types/src',
    from: ['./backend', './frontend', './fake-services'],
    message: 'shared-types stands alone.',
  },
  {
    target: './frontend/src/{theme,drawings,components,lib}',
    from: './frontend/src/{features,app}',
    message: 'Shared pieces know no page.',
  },
];

export default tseslint.config(
  { ignores: ['**/dist/**', '**/dist-types/**', '**/node_modules/**', '.data/**'] },
  {
    files: ['**/*.{ts,tsx}'],
    extends: [...tseslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { projectService: { allowDefaultProject: ['vitest.config.ts'] }, tsconfigRootDir: import.meta.dirname } },
    plugins: { 'import-x': importX },
    settings: {
      'import-x/resolver': { node: { extensions: ['.ts', '.tsx', '.js'] } },
      'import-x/extensions': ['.ts', '.tsx'],
    },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrorsIgnorePattern: '^_' },
      ],
      '@typescript-eslint/require-await': 'off',
      'import-x/no-restricted-paths': ['error', { zones }],
      'no-restricted-properties': [
        'error',
        { object: 'process', property: 'env', message: 'Only config/ reads the environment.' },
      ],
      'max-lines': ['error', { max: 320, skipBlankLines: true, skipComments: true }],
      'no-warning-comments': ['error', { terms: ['todo', 'fixme'] }],
    },
  },
  {
    // Nest takes the types of constructor parameters at run time: a type-only import there would erase what is injected.
    files: ['backend/**/*.ts', 'tests/**/*.ts'],
    rules: { '@typescript-eslint/consistent-type-imports': 'off' },
  },
  {
    files: [
      '**/*.cli.ts',
      'backend/src/main.ts',
      'backend/src/testing/**',
      'fake-services/src/**/main.ts',
      '**/*.config.ts',
      'tests/**/*.ts',
      '**/*.spec.ts',
    ],
    rules: { 'no-restricted-properties': 'off' },
  },
  {
    files: ['**/*.spec.{ts,tsx}', 'backend/src/testing/**', 'tests/**/*.ts'],
    rules: {
      // supertest's bodies are of any shape until a test looks at them
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/unbound-method': 'off',
      'max-lines': ['error', { max: 600, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['frontend/src/**/*.{ts,tsx}'],
    extends: [reactHooks.configs.flat.recommended, ...queryPlugin.configs['flat/recommended']],
  },
);
