import { expect, test as base, type BrowserContext, type Page } from '@playwright/test'
import { signIn } from '@/tests/api/support/sign-in'

export interface Scenario {
  /** Serves the demo scenario. */
  readonly url: string
  /** Password of everyone in it. */
  readonly password: string
  /** Serves an empty database. */
  readonly emptyUrl: string
  /** What the log of the empty one tells. */
  readonly setupCode: string
}

/** What the global setup started; workers inherit its environment. */
function startedScenario(): Scenario {
  const text = process.env.BROWSER_TEST_SCENARIO
  if (text === undefined) throw new Error('the global setup has not run')
  return JSON.parse(text) as Scenario
}

interface Fixtures {
  readonly scenario: Scenario
  /** Answers that a test expects to be refused; the browser reports each on the console. */
  readonly expected: RegExp[]
}

/** Playwright's test, with the served scenario as base address and a page that may not complain on the console. */
export const test = base.extend<Fixtures>({
  scenario: async ({}, give) => give(startedScenario()),
  baseURL: async ({ scenario: { url } }, give) => give(url),
  expected: [
    async ({ page }, give) => {
      const expected: RegExp[] = []
      const complaints: string[] = []
      page.on('console', (message) => {
        if (message.type() === 'error' || message.type() === 'warning') complaints.push(`${page.url()}: ${message.text()}`)
      })
      page.on('pageerror', (error) => complaints.push(`${page.url()}: ${error.message}`))
      await give(expected)
      const unexpected = complaints.filter((complaint) => !expected.some((pattern) => pattern.test(complaint)))
      expect(unexpected, 'the console stays free of complaints').toEqual([])
    },
    { auto: true },
  ],
})

/** Signs in through the page, as a person does. */
export async function signInThroughThePage(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(/\/teams\//)
}

/** Gives the browser a session without the way through the page. */
export async function holdSession(context: BrowserContext, { url, password }: Scenario, email: string): Promise<void> {
  const { cookie } = await signIn(url, email, password)
  const cookies = cookie.split('; ').map((pair) => ({ name: pair.slice(0, pair.indexOf('=')), value: pair.slice(pair.indexOf('=') + 1), url }))
  await context.addCookies(cookies)
}

export { expect }
