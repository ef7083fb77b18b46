import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript';
import importX from 'eslint-plugin-import-x';
import reactHooks from 'eslint-plugin-react-hooks';
import reactRefresh from 'eslint-plugin-react-refresh';
import { readdirSync } from 'node:fs';
import globals from 'globals';
import tseslint from 'typescript-eslint';

/** The service's modules in the one order that is allowed: a module imports only those before it. */
const modules = [
  'platform',
  'audit',
  'mail',
  'files',
  'people',
  'comments',
  'valves',
  'trends',
  'limits',
  'assessments',
  'findings',
  'changes',
  'ranking',
  'reviews',
  'runs',
  'search',
  'operations',
];

const serviceZones = modules.slice(0, -1).map((module, i) => ({
  target: `./service/src/${module}`,
  from: modules.slice(i + 1).map((later) => `./service/src/${later}`),
  message: `${module} stands before this module; whoever needs both stands after both.`,
}));

const folders = (path) => {
  try {
    return readdirSync(new URL(path, import.meta.url), { withFileTypes: true })
      .filter((entry) => entry.isDirectory())
      .map((entry) => entry.name);
  } catch {
    return [];
  }
};

const features = folders('./dashboard/src/features');
const featureZones = features.map((feature) => ({
  target: `./dashboard/src/features/${feature}`,
  from: features
    .filter((other) => other !== feature)
    .map((other) => `./dashboard/src/features/${other}`)
    .concat('./dashboard/src/app'),
  message: 'Features never import each other; a route composes them.',
}));

const zones = [
  {
    target: './shared/src/core',
    from: [
      './shared/src/contracts',
      './shared/src/messages',
      './shared/src/charts',
      './shared/src/simulation',
    ],
    message: 'The core knows numbers only.',
  },
  {
    target: './shared/src/simulation',
    from: ['./shared/src/contracts', './shared/src/messages', './shared/src/charts'],
  },
  {
    target: './shared/src/charts',
    from: ['./shared/src/contracts', './shared/src/messages', './shared/src/simulation'],
  },
  {
    target: './shared/src/contracts',
    from: ['./shared/src/charts', './shared/src/messages', './shared/src/simulation'],
  },
  { target: './service/src', from: ['./dashboard'] },
  { target: './dashboard/src', from: ['./service'] },
  {
    target: './dashboard/src/lib',
    from: ['./dashboard/src/ui', './dashboard/src/charts', './dashboard/src/features', './dashboard/src/app'],
  },
  {
    target: './dashboard/src/ui',
    from: ['./dashboard/src/charts', './dashboard/src/features', './dashboard/src/app'],
  },
  { target: './dashboard/src/charts', from: ['./dashboard/src/features', './dashboard/src/app'] },
  ...serviceZones,
  ...featureZones,
];

export default tseslint.config(
  { ignores: ['**/dist/**', '**/node_modules/**', '.data/**', '.test-results/**'] },
  js.configs.recommended,
  tseslint.configs.recommendedTypeChecked,
  importX.flatConfigs.typescript,
  {
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    plugins: { 'import-x': importX },
    settings: {
      'import-x/resolver-next': [
        createTypeScriptImportResolver({
          project: ['shared/tsconfig.json', 'service/tsconfig.json', 'dashboard/tsconfig.json'],
          noWarnOnMultipleProjects: true,
        }),
      ],
    },
    rules: {
      'import-x/no-restricted-paths': ['error', { zones }],
      'import-x/no-cycle': 'error',
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/switch-exhaustiveness-check': 'error',
      eqeqeq: 'error',
      'no-console': 'error',
    },
  },
  {
    // Injected classes must stay value imports: Nest reads them from decorator metadata.
    files: ['service/**/*.ts'],
    rules: { '@typescript-eslint/consistent-type-imports': 'off' },
  },
  {
    files: ['shared/src/core/**/*.ts', 'shared/src/simulation/**/*.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'Time is an argument here.' },
        { object: 'Math', property: 'random', message: 'Seed is an argument here.' },
      ],
    },
  },
  {
    files: ['dashboard/src/**/*.{ts,tsx}'],
    ...reactHooks.configs.flat.recommended,
  },
  {
    files: ['dashboard/src/**/*.tsx'],
    plugins: { 'react-refresh': reactRefresh },
    languageOptions: { globals: globals.browser },
    rules: {
      'react-refresh/only-export-components': [
        'error',
        { allowConstantExport: true, allowExportNames: ['loader', 'ErrorBoundary', 'Component', 'handle'] },
      ],
    },
  },
  {
    files: ['**/*.{test,spec,e2e-spec}.{ts,tsx}', 'service/test/**', 'dashboard/e2e/**'],
    rules: {
      'max-lines': ['error', { max: 500, skipBlankLines: true, skipComments: true }],
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  {
    files: ['service/src/cli/**', 'shared/accuracy/**', 'shared/bench/**', 'service/bench/**'],
    rules: { 'no-console': 'off' },
  },
  { files: ['**/*.{js,mjs}'], ...tseslint.configs.disableTypeChecked },
  {
    files: ['**/*.{js,mjs}'],
    languageOptions: { globals: globals.node },
    rules: { 'no-console': 'off' },
  },
  prettier,
);
