import { cutText } from './support/findings'
import { look, open, VIEWS } from './support/look'
import { ARABIC_NAME, LONG_NAME, LONG_NAMES, MANY_FINDINGS, MANY_LINKS, RIGHT_TO_LEFT } from './support/odd-files'
import { startOwnServer, type OwnServer } from './support/own-server'
import { expect, holdSession, test } from './support/scenario'

const LONG_SLUG = 'x'.repeat(64)
const TEAM = '/teams/tarnholm'
const at = (slug: string, rest = '') => `${TEAM}/models/${slug}/revisions/1${rest}`

let server: OwnServer

test.beforeAll(async () => {
  test.setTimeout(240_000)
  server = await startOwnServer()
  await server.store({ name: LONG_NAME, slug: LONG_SLUG, note: 'n'.repeat(2000) }, LONG_NAMES)
  await server.store({ slug: LONG_SLUG, note: 'r'.repeat(2000), further: true }, LONG_NAMES.replaceAll('0 0 0.1', '0 0 0.2'))
  await server.store({ name: ARABIC_NAME, slug: 'right-to-left', note: 'מידות שנמדדו במעבדה (כיול 2).' }, RIGHT_TO_LEFT)
  await server.store({ slug: 'right-to-left', note: 'قيست مرة أخرى', further: true }, RIGHT_TO_LEFT.replaceAll('0 0 0.1', '0 0 0.2'))
  await server.store({ name: 'Centipede', slug: 'centipede' }, MANY_LINKS)
  await server.store({ name: 'Talkative', slug: 'talkative' }, MANY_FINDINGS)
  await server.move('ines', LONG_SLUG, 1, 'in-review', 'c'.repeat(500))
  await server.move('tomas', LONG_SLUG, 1, 'draft')
  await server.move('ines', LONG_SLUG, 1, 'in-review', 'לבדיקה, תודה 🙏')
  await server.move('ines', 'right-to-left', 1, 'in-review', 'للمراجعة')
})
test.afterAll(() => server?.stop())

/** What is looked at: who, where, and what has to be there in full. */
const PLACES: readonly (readonly [name: string, path: string, text?: string])[] = [
  ['desk', TEAM, LONG_NAME],
  ['register', `${TEAM}/models`, LONG_NAME],
  ['long-sheet', at(LONG_SLUG), LONG_NAME],
  ['long-source', at(LONG_SLUG, '/source')],
  ['long-comparison', `${TEAM}/models/${LONG_SLUG}/comparison?from=1&to=2`],
  ['long-reference-poses', at(LONG_SLUG, '/reference-poses/new')],
  ['right-to-left-sheet', at('right-to-left'), 'ذراع الورشة'],
  ['right-to-left-source', at('right-to-left', '/source')],
  ['right-to-left-comparison', `${TEAM}/models/right-to-left/comparison?from=1&to=2`],
  ['links-130-sheet', at('centipede')],
  ['links-130-reference-poses', at('centipede', '/reference-poses/new')],
  ['links-130-comparison', `${TEAM}/models/centipede/comparison`],
  ['findings-3000-sheet', at('talkative')],
  ['findings-3000-source', at('talkative', '/source')],
]

const PAPER = VIEWS.filter(({ colorScheme }) => colorScheme === 'light')

for (const [name, path, text] of PLACES) {
  for (const view of PAPER) {
    test(`odd content breaks nothing and loses nothing: ${name}, ${view.name}`, async ({ page, context }) => {
      await holdSession(context, { ...server, emptyUrl: '', setupCode: '' }, name === 'desk' ? 'tomas@tarnholm.example' : 'ines@tarnholm.example')
      await open(page, view, server.url + path)
      if (text !== undefined) await expect(page.locator('main').getByText(text).first()).toBeVisible()
      await look(page, view, `odd-${name}`)
      expect(await cutText(page), 'no text is cut off').toEqual([])
    })
  }
}

for (const [name, file, findings] of [['long', LONG_NAMES, 0], ['right-to-left', RIGHT_TO_LEFT, 1], ['findings-3000', MANY_FINDINGS, 3000]] as const) {
  for (const view of PAPER) {
    test(`the import page takes odd content: ${name}, ${view.name}`, async ({ page, context }) => {
      await holdSession(context, { ...server, emptyUrl: '', setupCode: '' }, 'ines@tarnholm.example')
      await open(page, view, `${server.url}${TEAM}/models/import`)
      await page.getByLabel('URDF file').setInputFiles({ name: `${'f'.repeat(120)}.urdf`, mimeType: 'application/xml', buffer: Buffer.from(file) })
      await page.getByRole('heading', { name: 'Findings' }).waitFor()
      if (findings > 0) {
        const list = page.getByRole('list', { name: 'Findings' }).or(page.getByRole('region', { name: `${findings} findings` })).first()
        await list.getByRole('button', { name: /^Show line/ }).first().click()
        await expect(page.locator('[data-place]')).toBeVisible()
      }
      await look(page, view, `odd-import-${name}`)
      expect(await cutText(page), 'no text is cut off').toEqual([])
    })
  }
}

test('of 3 000 findings only those in sight exist, and the last is reached by its line', async ({ page, context }) => {
  await holdSession(context, { ...server, emptyUrl: '', setupCode: '' }, 'ines@tarnholm.example')
  const line = MANY_FINDINGS.slice(0, MANY_FINDINGS.lastIndexOf('0 0 2')).split('\n').length
  await page.goto(`${server.url}${at('talkative', '/source')}#L${line}`)
  const list = page.getByRole('region', { name: '3000 findings' })
  await expect(list.locator(`[aria-posinset="3000"] [aria-pressed="true"]`)).toBeVisible()
  expect(await list.locator('li').count()).toBeLessThan(60)
  await expect(page.locator('[data-place]')).toContainText('0')
})
