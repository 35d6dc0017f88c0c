import type { Page } from '@playwright/test'
import { look, open, VIEWS } from './support/look'
import { startOwnServer, type OwnServer } from './support/own-server'
import { expect, holdSession, test } from './support/scenario'

const MODELS = 600
let server: OwnServer

test.beforeAll(async () => {
  test.setTimeout(240_000)
  server = await startOwnServer({ models: MODELS })
})
test.afterAll(() => server?.stop())
test.beforeEach(({ context }) => holdSession(context, { ...server, emptyUrl: '', setupCode: '' }, 'ines@tarnholm.example'))

const register = () => `${server.url}/teams/tarnholm/models`
const rows = (page: Page) => page.getByRole('table', { name: 'Models' }).getByRole('row')
const focusedRow = (page: Page) => page.locator('[role="row"]:has(:focus)')

for (const view of VIEWS) {
  test(`a long register is readable and accessible, ${view.name}`, async ({ page }) => {
    await open(page, view, register())
    await look(page, view, 'register-long')
  })
}

test('only the rows in sight exist, and scrolling to the end loads all of them', async ({ page }) => {
  await page.goto(register())
  await expect(rows(page).first()).toBeVisible()
  const table = page.getByRole('table', { name: 'Models' })
  await expect(table).toHaveAttribute('aria-rowcount', '-1')
  for (let turn = 0; turn < 60 && (await table.getAttribute('aria-rowcount')) === '-1'; turn++) {
    await page.mouse.wheel(0, 6000)
    await page.waitForTimeout(100)
  }
  const count = Number(await table.getAttribute('aria-rowcount'))
  expect(count).toBeGreaterThan(MODELS)
  await expect(page.getByRole('status').filter({ hasText: /^\d+ models$/ })).toHaveText(`${count - 1} models`)
  expect(await rows(page).count()).toBeLessThan(80)
  await page.evaluate(() => window.scrollTo(0, document.documentElement.scrollHeight))
  await expect(page.locator(`[aria-rowindex="${count}"]`)).toBeVisible()
})

test('the keyboard leads from the search through the rows and back, and opens a sheet', async ({ page }) => {
  await page.goto(register())
  const search = page.getByRole('searchbox', { name: 'Search' })
  await search.fill('arm-')
  await expect(page).toHaveURL(/query=arm-/)
  await expect(rows(page).nth(1)).toContainText('arm-00000')
  await search.press('ArrowDown')
  await expect(focusedRow(page)).toHaveAttribute('aria-rowindex', '2')
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('ArrowDown')
  await expect(focusedRow(page)).toHaveAttribute('aria-rowindex', '4')
  await page.keyboard.press('ArrowUp')
  await expect(focusedRow(page)).toHaveAttribute('aria-rowindex', '3')
  await page.keyboard.press('End')
  await expect.poll(async () => Number(await focusedRow(page).getAttribute('aria-rowindex'))).toBeGreaterThan(90)
  await page.keyboard.press('Home')
  await expect(focusedRow(page)).toHaveAttribute('aria-rowindex', '2')
  await page.keyboard.press('/')
  await expect(search).toBeFocused()
  await expect(search).toHaveValue('arm-')
  await search.press('ArrowDown')
  await page.keyboard.press('Enter')
  await page.waitForURL(/\/models\/arm-00000\/revisions\/5$/)
})

test('filters stand in the address, going back takes them away one by one, and typing leaves one step', async ({ page }) => {
  await page.goto(register())
  const search = page.getByRole('searchbox', { name: 'Search' })
  await page.getByLabel('Has a revision').selectOption('draft')
  await expect(page).toHaveURL(/\?status=draft$/)
  await search.pressSequentially('storche', { delay: 20 })
  await expect(page).toHaveURL(/query=storche/)
  await search.pressSequentially(' 5', { delay: 400 })
  await expect(page).toHaveURL(/query=storche(%20|\+)5/)
  await expect(rows(page).nth(1)).toContainText('Störche 5')
  await page.goBack()
  await expect(page).toHaveURL(/\?status=draft$/)
  await expect(search).toHaveValue('')
  await expect(rows(page).nth(1)).not.toContainText('Störche 5')
  await page.goBack()
  await expect(page).toHaveURL(register())
  await expect(page.getByLabel('Has a revision')).toHaveValue('')
  await page.goForward()
  await expect(page.getByLabel('Has a revision')).toHaveValue('draft')
})

test('a filtered address shows its list before any script runs', async ({ browser, scenario: _scenario }) => {
  const context = await browser.newContext({ javaScriptEnabled: false })
  await holdSession(context, { ...server, emptyUrl: '', setupCode: '' }, 'ines@tarnholm.example')
  const page = await context.newPage()
  await page.goto(`${register()}?query=arm-00042`)
  await expect(rows(page).filter({ hasText: 'arm-00042' })).toBeVisible()
  await context.close()
})
