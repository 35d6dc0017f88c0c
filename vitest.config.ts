import { defineConfig } from 'vitest/config'

const root = import.meta.dirname

/** `unit` is fast and needs nothing; `reference` asks Orocos KDL; `api` shares one built server over HTTP; `service` starts
 *  servers and databases of its own, and kills some of them. */
export default defineConfig({
  resolve: { alias: { '@': root } },
  test: {
    environment: 'node',
    pool: 'forks',
    maxWorkers: 2,
    testTimeout: 20_000,
    hookTimeout: 120_000,
    projects: [
      { extends: true, test: { name: 'unit', include: ['tests/{architecture,lib,components,openapi,samples,runner}/**/*.test.{ts,tsx}'] } },
      { extends: true, test: { name: 'reference', include: ['tests/reference/**/*.test.ts'] } },
      { extends: true, test: { name: 'api', include: ['tests/api/**/*.test.ts'], testTimeout: 60_000, globalSetup: 'tests/api/support/global-setup.ts' } },
      { extends: true, test: { name: 'service', include: ['tests/{db,service}/**/*.test.ts'], testTimeout: 240_000 } },
    ],
  },
})
