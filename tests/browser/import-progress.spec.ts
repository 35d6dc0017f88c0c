import { readFileSync } from 'node:fs'
import { expect, holdSession, test } from './support/scenario'

const FILE = { name: 'trainer.urdf', mimeType: 'application/xml', buffer: readFileSync('samples/flawed-warning.urdf') }

test.beforeEach(({ context, scenario }) => holdSession(context, scenario, 'ines@tarnholm.example'))

test('a check under way shows how far it is, and cancelling it leaves nothing behind', async ({ page }) => {
  let release = () => undefined as void
  const held = new Promise<void>((resolve) => (release = resolve))
  await page.route('**/imports/check', async (route) => {
    await held
    await route.continue().catch(() => undefined)
  })
  await page.goto('/teams/tarnholm/models/import')
  await page.getByLabel('URDF file').setInputFiles(FILE)
  await expect(page.getByRole('progressbar', { name: 'Checking' })).toHaveAttribute('aria-valuetext', / (of|sent)/)
  await page.getByRole('button', { name: 'Cancel' }).click()
  await expect(page.getByRole('alert').filter({ hasText: 'Cancelled. Nothing was stored.' })).toBeVisible()
  await expect(page.getByRole('progressbar')).toBeHidden()
  await expect(page.getByRole('heading', { name: 'Findings' })).toBeHidden()
  release()
  await page.unroute('**/imports/check')
  await page.getByLabel('URDF file').setInputFiles(FILE)
  await expect(page.getByRole('heading', { name: 'Findings' })).toBeVisible()
})

test('a line of the source leads to its finding, and a finding to its line', async ({ page }) => {
  await page.goto('/teams/tarnholm/models/import')
  await page.getByLabel('URDF file').setInputFiles(FILE)
  const finding = page.getByRole('list', { name: 'Findings' }).getByRole('article').first()
  const place = finding.getByRole('button', { name: /^Show line/ })
  const line = /line (\d+)/.exec((await place.getAttribute('aria-label')) ?? '')?.[1]
  const source = page.getByRole('region', { name: 'Source of trainer.urdf' })
  await source.getByRole('button', { name: 'Line 1', exact: true }).click()
  await expect(source.locator('[aria-current]')).toContainText('<?xml')
  await expect(place).toHaveAttribute('aria-pressed', 'false')
  await source.getByRole('button', { name: `Line ${line}`, exact: true }).click()
  await expect(place).toHaveAttribute('aria-pressed', 'true')
  await source.getByRole('button', { name: 'Line 1', exact: true }).click()
  await place.click()
  await expect(source.locator('[aria-current]').getByRole('button')).toHaveText(String(line))
})
