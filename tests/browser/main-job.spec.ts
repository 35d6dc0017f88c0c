import { readFileSync } from 'node:fs'
import path from 'node:path'
import { expect, signInThroughThePage, test } from './support/scenario'

/** The trainer as a supplier might send it: one axis typed twice as long as it should be. The importer mends that and says so. */
const supplied = readFileSync(path.resolve('samples/trainer-3r.urdf'), 'utf8')
const AXES = '<axis xyz="0 0 1"/>'
const elbowAxis = supplied.indexOf(AXES, supplied.indexOf('name="elbow"'))
const file = `${supplied.slice(0, elbowAxis)}<axis xyz="0 0 2"/>${supplied.slice(elbowAxis + AXES.length)}`
const lineOfAxis = file.slice(0, elbowAxis).split('\n').length

const MODEL = '/teams/tarnholm/models/bench-trainer/revisions/1'

/** The planar arm with three links of 1 m in closed form. */
function planar(q: readonly [number, number, number]) {
  const angles = [q[0], q[0] + q[1], q[0] + q[1] + q[2]] as const
  const sum = (from: number, f: (angle: number) => number) => angles.slice(from).reduce((total, angle) => total + f(angle), 0)
  return {
    x: sum(0, Math.cos),
    y: sum(0, Math.sin),
    angle: angles[2],
    /** Columns (vx, vy) of the three joints. */
    columns: [0, 1, 2].map((from) => [-sum(from, Math.sin), sum(from, Math.cos)] as const),
  }
}

const close = (values: readonly number[], digits = 12) => values.map((value) => expect.closeTo(value, digits))

test('a file becomes a released model whose key answers the numbers of the closed form', async ({ page, scenario }) => {
  const { url, password } = scenario

  await test.step('ines imports the file and reads what the importer says', async () => {
    await signInThroughThePage(page, 'ines@tarnholm.example', password)
    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Register' }).click()
    await page.getByRole('link', { name: 'Import a URDF' }).click()
    await page.getByLabel('URDF file').setInputFiles({ name: 'trainer.urdf', mimeType: 'application/xml', buffer: Buffer.from(file) })
    const finding = page.getByRole('list', { name: 'Findings' }).getByRole('article')
    await expect(finding).toHaveCount(1)
    await expect(finding).toContainText('axis-normalised')
    await finding.getByRole('button', { name: new RegExp(`Show line ${lineOfAxis}, column`) }).click()
    await expect(page.getByRole('region', { name: 'Source of trainer.urdf' }).locator('[aria-current]')).toContainText('0 0 2')
  })

  await test.step('ines stores it as a model and submits it', async () => {
    await page.getByLabel('Name', { exact: true }).fill('Bench trainer')
    await page.getByRole('button', { name: 'Store as a new model' }).click()
    await page.waitForURL(`**${MODEL}`)
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Bench trainer')
    await page.getByRole('button', { name: 'Submit for review' }).click()
    const dialog = page.getByRole('dialog', { name: 'Submit for review' })
    await dialog.getByLabel('Comment').fill('Axis of the elbow was too long in the file; the importer mends it.')
    await dialog.getByRole('button', { name: 'Submit for review' }).click()
    await expect(dialog).toBeHidden()
    await expect(page.getByText('in review', { exact: true }).first()).toBeVisible()
    await page.getByRole('button', { name: 'Sign out' }).click()
    await page.waitForURL(`${url}/`)
  })

  await test.step('tomas finds it on his desk and releases it', async () => {
    await signInThroughThePage(page, 'tomas@tarnholm.example', password)
    await page.getByRole('link', { name: 'Decide on Bench trainer, revision 1' }).click()
    await page.waitForURL(`**${MODEL}`)
    await page.getByRole('button', { name: 'Release', exact: true }).click()
    const dialog = page.getByRole('dialog', { name: 'Release this revision' })
    await dialog.getByLabel('Comment').fill('Compared with the bench.')
    await dialog.getByRole('button', { name: 'Release', exact: true }).click()
    await expect(dialog).toBeHidden()
    await expect(page.getByText('released', { exact: true }).first()).toBeVisible()
    await expect(page.getByText('Tomas Aasen').first()).toBeVisible()
    await page.getByRole('button', { name: 'Sign out' }).click()
    await page.waitForURL(`${url}/`)
  })

  const key = await test.step('mira makes a key', async () => {
    await signInThroughThePage(page, 'mira@tarnholm.example', password)
    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Keys' }).click()
    await page.getByRole('button', { name: 'New key' }).click()
    const form = page.getByRole('dialog', { name: 'New key' })
    await form.getByLabel('Label').fill('Bench gateway')
    await expect(form.getByRole('checkbox', { name: /^compute/ })).toBeChecked()
    await form.getByRole('button', { name: 'Make the key' }).click()
    const made = page.getByRole('dialog', { name: /is made/ })
    const text = await made.getByText(/^elb_\w{12}_\w{49}$/).innerText()
    await made.getByRole('button', { name: 'I have kept it' }).click()
    await expect(page.getByRole('table', { name: 'Keys of the team' })).toContainText('Bench gateway')
    return text
  })

  const ask = async (question: string, body: object, fields: Record<string, string> = {}) => {
    const answer = await fetch(`${url}/api/v1${MODEL.replace('/revisions/1', '/revisions/released')}/${question}`, {
      method: 'POST',
      headers: { authorization: `Bearer ${key}`, 'content-type': 'application/json', ...fields },
      body: JSON.stringify(body),
    })
    return { status: answer.status, fingerprint: answer.headers.get('model-fingerprint'), body: (await answer.json()) as Record<string, unknown> }
  }
  const q = [0.4, 0.9, -0.6] as const
  const arm = planar(q)
  const configurations = [q]
  const task = { components: ['vx', 'vy'] }

  await test.step('the key asks where the tool is', async () => {
    const { status, fingerprint, body } = await ask('forward-kinematics', { configurations })
    expect(status).toBe(200)
    expect(body).toMatchObject({
      model: { team: 'tarnholm', model: 'bench-trainer', revision: 1, status: 'released', fingerprint },
      chain: { joints: ['shoulder', 'elbow', 'wrist'] },
      results: [{ pose: { position: close([arm.x, arm.y, 0]), quaternion: close([0, 0, Math.sin(arm.angle / 2), Math.cos(arm.angle / 2)]) }, withinLimits: true }],
    })
  })

  await test.step('the key asks for the Jacobian', async () => {
    const { body } = await ask('jacobian', { configurations })
    const rows = [arm.columns.map(([vx]) => vx), arm.columns.map(([, vy]) => vy), [0, 0, 0], [0, 0, 0], [0, 0, 0], [1, 1, 1]]
    expect(body).toMatchObject({ results: [{ jacobian: rows.map((row) => close(row)), rank: 3 }] })
  })

  await test.step('the key asks for the null space of the position', async () => {
    const { body } = await ask('null-space', { configurations, task })
    // One direction: the cross product of the two rows, of unit length; the basis may point either way along it.
    const [a, b, c] = arm.columns as [readonly [number, number], readonly [number, number], readonly [number, number]]
    const cross = [b[0] * c[1] - c[0] * b[1], c[0] * a[1] - a[0] * c[1], a[0] * b[1] - b[0] * a[1]]
    const unit = cross.map((value) => value / Math.hypot(...cross))
    const [{ rank, nullity, basis }] = body.results as [{ rank: number; nullity: number; basis: [number][] }]
    expect({ rank, nullity }).toEqual({ rank: 2, nullity: 1 })
    const side = Math.sign(basis[0]![0] * unit[0]!)
    expect(basis.map(([value]) => value * side)).toEqual(close(unit))
  })

  await test.step('the key asks for the joint rates of a slow straight motion', async () => {
    const wanted = [0.02, -0.03] as const
    const { body } = await ask('joint-rates', { configurations, task, twists: [[...wanted, 0, 0, 0, 0]] })
    // The smallest rates that do it: transpose of the rows times the inverse of the 2 x 2 Gram matrix times the velocity.
    const gram = (i: 0 | 1, j: 0 | 1) => arm.columns.reduce((sum, column) => sum + column[i] * column[j], 0)
    const determinant = gram(0, 0) * gram(1, 1) - gram(0, 1) ** 2
    const weights = [(gram(1, 1) * wanted[0] - gram(0, 1) * wanted[1]) / determinant, (gram(0, 0) * wanted[1] - gram(0, 1) * wanted[0]) / determinant] as const
    const rates = arm.columns.map(([vx, vy]) => vx * weights[0] + vy * weights[1])
    expect(body).toMatchObject({ results: [{ rates: close(rates), scale: 1, damping: 0, rank: 2, nullity: 1, diagnosis: [] }] })
  })

  await test.step('another fingerprint than the released one is refused', async () => {
    const { status, body } = await ask('forward-kinematics', { configurations }, { 'if-match': `"${'0'.repeat(64)}"` })
    expect({ status, type: body.type }).toEqual({ status: 412, type: '/docs/problems/fingerprint-mismatch' })
  })
})
