import { armEntries, makeZip, robotText } from '../lib/archive/make-zip'
import { look, open, VIEWS } from './support/look'
import { expect, holdSession, test } from './support/scenario'

const OUTSIDE = '<robot name="left"><link name="base"><visual><geometry><mesh filename="/srv/base.stl"/></geometry></visual><collision><geometry><mesh filename="gone.stl"/></geometry></collision></link></robot>'
const LONG = `arm/meshes/${'a-very-long-name-of-a-mesh-'.repeat(6)}.stl`

const archive = (name: string, bytes: Buffer) => ({ name, mimeType: 'application/zip', buffer: bytes })

test('an engineer imports an archive, chooses among its descriptions and sees where each mesh is', async ({ page, context, scenario }) => {
  await holdSession(context, scenario, 'ines@tarnholm.example')
  await page.goto('/teams/tarnholm/models/import')

  await test.step('a hostile archive is refused with the entry named', async () => {
    await page.getByLabel('URDF file or archive').setInputFiles(archive('slip.zip', makeZip(armEntries({ name: '../../base.stl', data: 'x' }))))
    await expect(page.getByText('The archive has an entry "../../base.stl", a path that is not taken.')).toBeVisible()
    await expect(page.getByRole('region', { name: 'Store it' })).toHaveCount(0)
  })

  await test.step('of several descriptions one is chosen, by keyboard, and its source is shown', async () => {
    await page.getByLabel('URDF file or archive').setInputFiles(archive('arms.zip', makeZip(armEntries({ name: 'left.urdf', data: OUTSIDE }, { name: LONG, data: 'solid long' }))))
    const chooser = page.getByLabel('Description, one of 2 in the archive')
    await expect(chooser).toHaveValue('')
    await chooser.selectOption('left.urdf')
    const meshes = page.getByRole('table', { name: 'Meshes that the description refers to' })
    await expect(meshes.getByRole('row', { name: '/srv/base.stl' })).toContainText('outside, not followed')
    await expect(meshes.getByRole('row', { name: 'gone.stl' })).toContainText('missing')
    await expect(page.getByRole('region', { name: 'Source of left.urdf' })).toContainText('<robot name="left">')
    await page.getByLabel('Description, one of 2 in the archive').focus()
    await page.keyboard.press('ArrowUp')
    await expect(meshes.getByRole('row', { name: 'package://arm/meshes/base.stl' })).toContainText('arm/meshes/base.stl')
    await expect(page.getByRole('region', { name: 'Source of arm/urdf/arm.urdf' })).toContainText('<robot name="arm">')
  })

  await test.step('it is stored with the description that was chosen, and the sheet offers its meshes', async () => {
    await page.getByLabel('Name', { exact: true }).fill('Out of an archive')
    await page.getByRole('button', { name: 'Store as a new model' }).click()
    await page.waitForURL(/out-of-an-archive\/revisions\/1$/)
    const meshes = page.getByRole('region', { name: 'Meshes' })
    await expect(meshes).toContainText('1 of 1 found')
    const [download] = await Promise.all([page.waitForEvent('download'), meshes.getByRole('link', { name: 'arm/meshes/base.stl' }).click()])
    expect(download.suggestedFilename()).toBe('base.stl')
    const [exported] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: 'Export the model' }).click()])
    expect(exported.suggestedFilename()).toBe('out-of-an-archive-export.zip')
    await expect(page.getByRole('region', { name: 'Used by' })).toContainText('No key has called this model yet.')
    await page.getByRole('link', { name: 'Source and findings' }).click()
    await expect(page.getByRole('region', { name: 'Source of arms.zip' })).toContainText('<robot name="arm">')
  })
})

for (const view of VIEWS) {
  test(`the import of an archive and its sheet are sound, ${view.name}`, async ({ page, context, scenario }) => {
    await holdSession(context, scenario, 'ines@tarnholm.example')
    await open(page, view, '/teams/tarnholm/models/import')
    const long = robotText(`package://arm/${LONG}`).replace('<link name="upper"/>', '<link name="upper"><visual><geometry><mesh filename="/srv/upper.stl"/></geometry></visual></link>')
    await page.getByLabel('URDF file or archive').setInputFiles(archive('arms.zip', makeZip([{ name: 'arm.urdf', data: long }, { name: LONG, data: 'solid long' }, { name: 'left.urdf', data: OUTSIDE }])))
    await page.getByLabel('Description, one of 2 in the archive').selectOption('arm.urdf')
    await expect(page.getByRole('table', { name: 'Meshes that the description refers to' })).toBeVisible()
    await look(page, view, 'import-archive')
    await page.getByLabel('Name', { exact: true }).fill(`Seen out of an archive, ${view.name}`)
    await page.getByRole('button', { name: 'Store as a new model' }).click()
    await page.waitForURL(/revisions\/1$/)
    await expect(page.getByRole('region', { name: 'Meshes' })).toContainText('1 of 2 found')
    await look(page, view, 'sheet-archive')
    await open(page, view, '/docs/archives')
    await look(page, view, 'docs-archives')
  })
}
