import { look, open, VIEWS } from './support/look'
import { expect, test } from './support/scenario'

// The tests of a file run in order. The page is gone once somebody has set the installation up, so it is looked at first.
test.use({ baseURL: async ({ scenario }, give) => give(scenario.emptyUrl) })

for (const view of VIEWS) {
  test(`set-up is readable and accessible, ${view.name}`, async ({ page }) => {
    await open(page, view, '/setup')
    await look(page, view, 'set-up')
  })
}

test('an empty installation asks the first visitor for the code in its log, and is then somebody\'s', async ({ page, scenario }) => {
  await page.goto('/')
  await page.waitForURL('**/setup')
  const fill = async (fields: Record<string, string>) => {
    for (const [label, text] of Object.entries(fields)) await page.getByLabel(label, { exact: true }).fill(text)
    await page.getByRole('button', { name: 'Set up' }).click()
  }
  const fields = { Team: 'Skua Cells', 'Your name': 'Alva Skogheim', 'E-mail': 'alva@skua.example', Password: 'a dozen quiet terns' }

  await fill({ 'Setup code': 'AAAA-BBBB-CCCC-DDDD', ...fields })
  await expect(page.getByText('This is not the code in the log.')).toBeVisible()
  await expect(page.getByLabel('Team', { exact: true })).toHaveValue('Skua Cells')

  await fill({ 'Setup code': scenario.setupCode })
  await page.waitForURL('**/sign-in?setUp=done')
  await page.getByLabel('E-mail').fill(fields['E-mail'])
  await page.getByLabel('Password').fill(fields.Password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL('**/teams/skua-cells')
  await expect(page.getByText('Alva Skogheim').first()).toBeVisible()

  await page.context().clearCookies()
  await page.goto('/setup')
  await page.waitForURL('**/sign-in')
})
