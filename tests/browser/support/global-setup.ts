import { PASSWORD, startServer } from '@/tests/api/support/server'
import type { Scenario } from './scenario'

/** Two built servers on embedded databases: one with the demo scenario, and an empty one that waits to be set up. */
export default async function setup(): Promise<() => Promise<void>> {
  const served = await startServer()
  const empty = await startServer({ seeded: false })
  const scenario: Scenario = { url: served.url, password: PASSWORD, emptyUrl: empty.url, setupCode: await setupCode(() => empty.log()) }
  process.env.BROWSER_TEST_SCENARIO = JSON.stringify(scenario)
  return async () => void (await Promise.all([served.stop(), empty.stop()]))
}

/** What a server prints may arrive a little after its first answer. */
async function setupCode(log: () => string): Promise<string> {
  for (;;) {
    const code = /setup code: ([^"\s]+)"/.exec(log())?.[1]
    if (code !== undefined) return code
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
}
