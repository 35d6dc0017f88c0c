import next from 'eslint-config-next/core-web-vitals'
import typescript from 'eslint-config-next/typescript'

const config = [
  { ignores: ['node_modules/**', '.next*/**', '.tmp/**', 'next-env.d.ts', 'drizzle/**', 'openapi/openapi.json'] },
  ...next,
  ...typescript,
  {
    rules: {
      'no-console': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'error',
    },
  },
  { files: ['lib/log.ts'], rules: { 'no-console': 'off' } },
]
export default config
