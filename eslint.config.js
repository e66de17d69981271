import tseslint from 'typescript-eslint'

const arrows = (regex, message) => ({
  'no-restricted-imports': ['error', { patterns: [{ regex, message }] }],
})

export default tseslint.config(
  { ignores: ['dist/**', 'node_modules/**'] },
  ...tseslint.configs.recommended,
  {
    files: ['server/**/*.ts', 'tests/**/*.ts', 'scripts/**/*.ts'],
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      'prefer-const': ['error', { destructuring: 'all' }],
      eqeqeq: 'error',
    },
  },
  {
    // The engine is pure: numbers in, numbers out.
    files: ['server/engine/**'],
    rules: {
      ...arrows(
        '^(?!\\.\\.?/(?!\\.\\./)|#engine/|suncalc$|ml-matrix$)',
        'The engine is pure: hand it the value as an argument.',
      ),
      'no-restricted-globals': ['error', 'Date', 'process', 'performance', 'fetch', 'crypto', 'console'],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'Take a seeded generator as an argument.' },
      ],
    },
  },
  {
    // The contract knows nobody.
    files: ['server/contract/**'],
    rules: arrows(
      '^(?!\\./|\\.\\./(?!\\.\\./)|zod$|#contract/)',
      'The contract imports only zod and itself.',
    ),
  },
  {
    // Modelling translates between contract and engine and stays pure.
    files: ['server/modelling/**'],
    rules: {
      ...arrows(
        '^(?!\\.\\.?/(?!\\.\\./)|#engine/|#contract/|#modelling/|mathjs)',
        'Modelling is pure: it knows the contract and the engine only.',
      ),
      'no-restricted-globals': ['error', 'Date', 'process', 'performance', 'fetch', 'crypto', 'console'],
    },
  },
)
