import hooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

// The way imports may go is told twice on purpose: here at once in the editor, in .dependency-cruiser.cjs for the whole.
const engineOnly = ['error', {
  patterns: [
    { regex: '^node:', message: 'The engine is pure: no files, network or processes.' },
    { regex: '^(react|react-native|expo|express|sequelize|zod|@tanstack)', message: 'The engine imports only its own files, shared/types and mathjs.' },
    { regex: '^@/(app|components|server|shared/(contracts|limits))', message: 'The engine imports only its own files, shared/types, and its words and number formats.' },
  ],
}];

export default tseslint.config(
  { ignores: ['dist/', 'build/', 'coverage/', '.expo/', '.data/', 'node_modules/', 'expo-env.d.ts', 'public/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: { parserOptions: { projectService: { allowDefaultProject: ['*.js', '*.cjs', '*.mjs'] }, tsconfigRootDir: import.meta.dirname } },
    rules: {
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-console': 'error',
      'no-warning-comments': ['error', { terms: ['todo', 'fixme', 'xxx'] }],
      'max-lines': ['error', { max: 340, skipBlankLines: true, skipComments: true }],
      '@typescript-eslint/ban-ts-comment': ['error', { 'ts-ignore': true, 'ts-expect-error': true, 'ts-nocheck': true }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports', disallowTypeAnnotations: false }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true, allowBoolean: true }],
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false, arguments: false } }],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  {
    files: ['app/**/*.{ts,tsx}', 'components/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': hooks },
    rules: {
      'react-hooks/rules-of-hooks': 'error',
      'react-hooks/exhaustive-deps': 'error',
      'no-restricted-imports': ['error', {
        paths: [{
          name: 'react-native',
          importNames: ['FlatList', 'SectionList', 'VirtualizedList', 'Button', 'CheckBox', 'Picker', 'ProgressBar', 'ImageBackground', 'YellowBox', 'TouchableHighlight', 'TouchableNativeFeedback', 'TouchableOpacity', 'TouchableWithoutFeedback'],
          message: 'Left out of the web bundle for its size, see assets/bundle/nativeUnused.js.',
        }, {
          name: 'expo-router',
          importNames: ['Stack', 'Tabs', 'ExperimentalStack'],
          message: 'Left out of the web bundle for its size, see assets/bundle/routerUnused.js.',
        }],
        patterns: [{ regex: '^(@/|\\.\\./+)server/', message: 'The client meets the server through shared/contracts only.' }],
      }],
    },
  },
  {
    files: ['shared/engine/**/*.ts'],
    rules: {
      'no-restricted-imports': engineOnly,
      'no-restricted-properties': ['error',
        { object: 'Math', property: 'random', message: 'The engine has no randomness: the same input gives the same trail.' },
        { object: 'Date', property: 'now', message: 'The engine has no clock.' }],
      'no-restricted-syntax': ['error',
        { selector: "NewExpression[callee.name='Date']", message: 'The engine has no clock.' },
        { selector: "Program > VariableDeclaration[kind='let']", message: 'The engine keeps no state in modules.' },
        { selector: "Program > ExportNamedDeclaration > VariableDeclaration[kind='let']", message: 'The engine keeps no state in modules.' }],
    },
  },
  {
    files: ['tests/**/*.{ts,tsx}'],
    rules: {
      // a test that is skipped or alone proves nothing about the rest
      'no-restricted-syntax': ['error',
        { selector: "MemberExpression[object.name=/^(it|test|describe)$/][property.name=/^(skip|only|todo|failing)$/]", message: 'Every test runs: no skip, only, todo or failing.' },
        { selector: "CallExpression[callee.name=/^(xit|xtest|xdescribe|fit|fdescribe)$/]", message: 'Every test runs: no skip or only.' }],
      'max-lines': ['error', { max: 500, skipBlankLines: true, skipComments: true }],
      '@typescript-eslint/unbound-method': 'off',
      '@typescript-eslint/require-await': 'off',
    },
  },
  { files: ['server/index.ts', 'server/measure/**/*.ts'], rules: { 'no-console': 'off' } },
  { files: ['**/*.{js,cjs,mjs}'], ...tseslint.configs.disableTypeChecked },
  { files: ['**/*.{js,cjs,mjs}'], rules: { '@typescript-eslint/no-require-imports': 'off' } },
);
