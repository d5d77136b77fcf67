import js from '@eslint/js';
import { defineConfig } from 'eslint/config';
import importX from 'eslint-plugin-import-x';
import reactHooks from 'eslint-plugin-react-hooks';
import globals from 'globals';
import tseslint from 'typescript-eslint';

/**
 * Import directions of the house. A folder may import from itself and from the folders listed beside it;
 * everything else is refused. `symbols`, `solver` and `src/values` import nothing of the project.
 */
const mayImport = {
  symbols: [],
  solver: [],
  'src/values': [],
  'src/parts': ['symbols', 'solver', 'src/values'],
  'src/stage': ['symbols', 'solver', 'src/values', 'src/parts'],
  'src/readings': ['symbols', 'solver', 'src/values', 'src/parts', 'src/stage'],
  'src/drawing': ['symbols', 'solver', 'src/values', 'src/parts', 'src/stage', 'src/readings'],
  'src/desk': ['symbols', 'solver', 'src/values', 'src/parts', 'src/stage', 'src/readings', 'src/drawing'],
};
// Small widgets that know nothing of stages.
mayImport['src/controls'] = [];
const core = [...Object.keys(mayImport)];
// The view folders stand side by side on the core; the page puts them together.
for (const view of ['sheet', 'ledger', 'drawers', 'head', 'tray', 'files', 'record', 'cli']) {
  mayImport[`src/${view}`] = [...core];
}
const views = Object.keys(mayImport).filter((folder) => folder.startsWith('src/'));

const zones = Object.entries(mayImport).flatMap(([folder, allowed]) => {
  const others = ['symbols', 'solver', ...views, 'src/page'].filter(
    (other) => other !== folder && !allowed.includes(other),
  );
  return others.map((from) => ({
    target: `./${folder}`,
    from: `./${from}`,
    message: `${folder} may import only from ${allowed.length > 0 ? allowed.join(', ') : 'itself'}.`,
  }));
});

export default defineConfig(
  { ignores: ['dist/**', '.cache/**', 'node_modules/**', 'test-results/**', 'playwright-report/**'] },
  js.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.strictTypeChecked, tseslint.configs.stylisticTypeChecked],
  },
  {
    languageOptions: {
      globals: { ...globals.browser, ...globals.node },
      parserOptions: {
        projectService: { allowDefaultProject: ['*.js'] },
        tsconfigRootDir: import.meta.dirname,
      },
    },
    plugins: { 'import-x': importX },
    settings: {
      'import-x/resolver-next': [importX.createNodeResolver({ extensions: ['.ts', '.tsx', '.js', '.mjs'] })],
    },
    rules: {
      'import-x/no-restricted-paths': ['error', { basePath: import.meta.dirname, zones }],
      'import-x/no-cycle': 'error',
    },
  },
  {
    files: ['**/*.{ts,tsx}'],
    rules: {
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/consistent-type-imports': 'error',
    },
  },
  {
    // Typed-array reads checked by construction: the two folders where the plan of record allows `!`.
    files: ['solver/matrix/**', 'solver/elements/**'],
    rules: { '@typescript-eslint/no-non-null-assertion': 'off' },
  },
  {
    files: ['src/**/*.tsx'],
    plugins: { 'react-hooks': reactHooks },
    rules: reactHooks.configs.recommended.rules,
  },
  {
    // Konva's own Stage is imported as KonvaStage, in sheet/ alone.
    files: ['**/*.{ts,tsx}'],
    ignores: ['src/sheet/**'],
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ group: ['konva', 'konva/*', 'react-konva', 'react-konva/*'] }] },
      ],
    },
  },
  { files: ['**/*.{js,mjs}'], extends: [tseslint.configs.disableTypeChecked] },
);
