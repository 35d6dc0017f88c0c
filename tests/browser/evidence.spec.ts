import { expect, holdSession, test } from './support/scenario'

const SHEET = '/teams/tarnholm/models/trainer-3r/revisions/1'

/** Measured poses of the planar arm with three links of 1 m, in mm and degrees, as a spreadsheet with decimal commas writes them. */
const HEAD = 'shoulder [deg];elbow [deg];wrist [deg];x [mm];y [mm];z [mm];roll;pitch;yaw'
const WRONG = `${HEAD}\n0;0;0;3000,1;0;0;0;0;0\n0;90;0;1000,2;abc;0;0;0;90`
const RIGHT = `${HEAD}\n0;0;0;3000,1;0;0;0;0;0\n0;90;0;1000,2;2000;0;0;0;90`

test('an engineer holds measured poses against the model and stores them as evidence', async ({ page, context, scenario, expected }) => {
  expected.push(/status of 422/)
  await holdSession(context, scenario, 'ines@tarnholm.example')
  await page.goto(SHEET)
  await page.getByRole('link', { name: 'Add reference poses' }).click()
  await page.waitForURL(`**${SHEET}/reference-poses/new`)

  await test.step('nothing is guessed: units, orientation and what was measured have to be chosen', async () => {
    await page.getByRole('button', { name: 'Check', exact: true }).click()
    await expect(page.getByText('Choose the units that the table is in.')).toBeVisible()
    await expect(page.getByText('Choose how the orientations are written.')).toBeVisible()
    await expect(page.getByText('Choose what was measured.')).toBeVisible()
  })

  await test.step('a dropped file fills the table, and a bad cell is named by row and column', async () => {
    await page.getByLabel('CSV file').setInputFiles({ name: 'measured.csv', mimeType: 'text/csv', buffer: Buffer.from(WRONG) })
    await expect(page.getByLabel('Measured poses, as CSV')).toHaveValue(WRONG)
    await page.getByLabel('Units of the table').selectOption('millimetres and degrees')
    await page.getByLabel('Orientation is written as').selectOption('Roll, pitch, yaw about fixed x, y, z')
    await expect(page.getByText('R = Rz(yaw) · Ry(pitch) · Rx(roll)')).toBeVisible()
    await page.getByLabel('Measured was').selectOption('the tip link itself')
    await page.getByLabel('Tolerance of position, mm').fill('0,5')
    await page.getByLabel('Tolerance of orientation, deg').fill('0.1')
    await page.getByLabel('Note').fill('Dial gauge on the bench.')
    await page.getByRole('button', { name: 'Check', exact: true }).click()
    await expect(page.getByRole('alert').filter({ hasText: 'row 3, column 5 (y): "abc" is not a number' })).toBeVisible()
  })

  await test.step('the check shows the residuals, and storing keeps them', async () => {
    await page.getByLabel('Measured poses, as CSV').fill(RIGHT)
    await page.getByLabel('Measured poses, as CSV').press('Tab')
    await page.getByRole('button', { name: 'Check', exact: true }).click()
    const outcome = page.getByRole('region', { name: 'Outcome, not stored yet' })
    await expect(outcome).toContainText('All 2 poses are within the tolerance. Largest error 0.200 mm and 0.000 °')
    await page.getByRole('button', { name: 'Store as evidence' }).click()
    await page.waitForURL(/reference-poses\/\d+$/)
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Reference poses 1')
    await expect(page.getByText('Dial gauge on the bench.')).toBeVisible()
    await expect(page.getByRole('table', { name: 'Residuals by row' }).getByRole('row')).toHaveCount(3)
  })

  await test.step('a row opens the sheet where it was measured, and the sheet lists the set', async () => {
    await page.getByRole('link', { name: 'Row 3, on the sheet' }).click()
    await page.waitForURL(/q=0%2C90%2C0/)
    const evidence = page.getByRole('region', { name: 'Evidence' })
    await expect(evidence.getByRole('list', { name: 'Reference poses' })).toContainText('pass')
    const [download] = await Promise.all([page.waitForEvent('download'), evidence.getByRole('link', { name: 'Check vectors, CSV' }).click()])
    expect(download.suggestedFilename()).toBe('trainer-3r-revision-1-check-vectors.csv')
  })
})

test('an approver compares two revisions and opens the worst configuration on both sheets', async ({ page, context, scenario }) => {
  await holdSession(context, scenario, 'tomas@tarnholm.example')
  await page.goto('/teams/tarnholm/models/skerry-7/revisions/2')
  await page.getByRole('link', { name: 'Compare', exact: true }).click()
  await page.waitForURL('**/comparison?from=1&to=2')
  await expect(page.getByText('For the same joint values the tip moves by up to 0.673 mm and does not turn.')).toBeVisible()
  await expect(page.getByRole('table', { name: 'Limits that differ' })).toContainText('narrowed')
  await expect(page.getByRole('table', { name: 'Elements that differ' }).getByRole('row')).toHaveCount(9)

  const address = page.url()
  for (const revision of [1, 2]) {
    await page.getByRole('link', { name: `Revision ${revision} where it moves most` }).click()
    await page.waitForURL(new RegExp(`/revisions/${revision}\\?base=base_link&tip=tool_flange&q=`))
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Skerry 7')
    await page.goto(address)
  }

  await test.step('the form chooses other links and revisions, and works by keyboard', async () => {
    await page.getByLabel('Tip link').fill('link_4')
    await page.getByLabel('Tip link').press('Enter')
    await page.waitForURL(/tip=link_4/)
    await expect(page.getByRole('table', { name: 'Worst configuration' })).not.toContainText('wrist')
    await page.getByLabel('From revision').selectOption('2')
    await page.getByRole('button', { name: 'Compare', exact: true }).click()
    await expect(page.getByText('No kinematic change')).toBeVisible()
  })
})
