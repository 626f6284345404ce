import js from '@eslint/js'
import prettier from 'eslint-config-prettier'
import vue from 'eslint-plugin-vue'
import globals from 'globals'
import ts from 'typescript-eslint'

/** Mathematical functions whose last bits differ between JavaScript engines; the computation must not use them. */
const engineDependent = [
  'exp',
  'expm1',
  'log',
  'log1p',
  'log2',
  'log10',
  'pow',
  'sin',
  'cos',
  'tan',
  'asin',
  'acos',
  'atan',
  'atan2',
  'sinh',
  'cosh',
  'tanh',
  'cbrt',
  'hypot',
  'random',
]

export default ts.config(
  { ignores: ['node_modules', '.data', '**/dist', '**/released/**'] },
  js.configs.recommended,
  ...ts.configs.recommended,
  ...vue.configs['flat/recommended'],
  { files: ['**/*.vue'], languageOptions: { parserOptions: { parser: ts.parser } } },
  {
    languageOptions: { globals: { ...globals.node, ...globals.browser } },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'error',
      'vue/multi-word-component-names': 'off',
      'vue/no-v-html': 'error',
      'no-undef': 'off',
    },
  },
  {
    files: ['packages/metrology/src/**/*.ts'],
    ignores: ['**/*.test.ts', '**/cli.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        ...engineDependent.map((property) => ({
          object: 'Math',
          property,
          message: 'Differs between JavaScript engines; use the deterministic functions of @stdlib.',
        })),
      ],
      'no-restricted-syntax': [
        'error',
        {
          selector: "BinaryExpression[operator='**']",
          message: 'The power operator differs between JavaScript engines.',
        },
      ],
      'no-restricted-globals': ['error', 'Date', 'process', 'crypto', 'fetch', 'performance'],
    },
  },
  prettier,
)
