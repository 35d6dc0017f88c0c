import type { Page } from '@playwright/test'
import { look, open, VIEWS } from './support/look'
import { holdSession, test } from './support/scenario'

interface Look {
  readonly name: string
  readonly path: string
  /** Who looks; a visitor without an account when left out. */
  readonly who?: 'mira' | 'tomas' | 'ines' | 'kofi'
  /** Leads from the page at its address to the state that is looked at. */
  readonly act?: (page: Page) => Promise<void>
  /** What the browser may report on the console. */
  readonly expected?: RegExp
}

const TEAM = '/teams/tarnholm'
const NOT_FOUND = /status of 404/
const press = (name: string) => (page: Page) => page.getByRole('button', { name, exact: true }).first().click()
const drop = (file: string) => async (page: Page) => {
  await page.getByLabel('URDF file').setInputFiles(`samples/${file}`)
  await page.getByRole('heading', { name: 'Findings' }).waitFor()
}

/** Every page, and the states of a page that look different. */
const LOOKS: readonly Look[] = [
  { name: 'front', path: '/' },
  { name: 'sign-in', path: '/sign-in' },
  { name: 'docs', path: '/docs' },
  { name: 'docs-conventions', path: '/docs/conventions' },
  { name: 'docs-evidence', path: '/docs/evidence' },
  { name: 'docs-reference', path: '/docs/reference', act: (page) => page.locator('.swagger-ui .opblock').first().waitFor() },
  { name: 'docs-errors', path: '/docs/errors' },
  { name: 'docs-problem', path: '/docs/problems/fingerprint-mismatch' },
  { name: 'docs-findings', path: '/docs/findings' },
  { name: 'docs-finding', path: '/docs/findings/axis-normalised' },
  { name: 'docs-formats', path: '/docs/formats' },
  { name: 'docs-methods', path: '/docs/methods' },
  { name: 'docs-cautions', path: '/docs/cautions' },
  { name: 'nothing-here', path: '/docs/nothing-here', expected: NOT_FOUND },
  { name: 'no-such-model', path: `${TEAM}/models/nothing-here`, who: 'ines', expected: NOT_FOUND },
  { name: 'desk-approver', path: TEAM, who: 'tomas' },
  { name: 'desk-reader', path: TEAM, who: 'kofi' },
  { name: 'register', path: `${TEAM}/models`, who: 'ines' },
  { name: 'register-nothing-found', path: `${TEAM}/models?query=albatross`, who: 'ines' },
  { name: 'import', path: `${TEAM}/models/import`, who: 'ines' },
  { name: 'import-warning', path: `${TEAM}/models/import`, who: 'ines', act: drop('flawed-warning.urdf') },
  { name: 'import-error', path: `${TEAM}/models/import`, who: 'ines', act: drop('flawed-error.urdf') },
  { name: 'import-reader', path: `${TEAM}/models/import`, who: 'kofi' },
  { name: 'sheet-released', path: `${TEAM}/models/skerry-7/revisions/2`, who: 'kofi' },
  { name: 'sheet-superseded', path: `${TEAM}/models/skerry-7/revisions/1`, who: 'tomas' },
  { name: 'sheet-in-review', path: `${TEAM}/models/fulmar-6/revisions/1`, who: 'tomas' },
  { name: 'sheet-rail', path: `${TEAM}/models/skerry-7-rail/revisions/1`, who: 'ines' },
  { name: 'sheet-scara', path: `${TEAM}/models/gannet-4/revisions/1`, who: 'ines' },
  { name: 'sheet-planar', path: `${TEAM}/models/trainer-3r/revisions/1`, who: 'ines' },
  { name: 'sheet-warning', path: `${TEAM}/models/dunlin-2/revisions/1`, who: 'ines' },
  { name: 'sheet-release-dialog', path: `${TEAM}/models/fulmar-6/revisions/1`, who: 'tomas', act: press('Release') },
  { name: 'comparison', path: `${TEAM}/models/skerry-7/comparison?from=1&to=2`, who: 'tomas' },
  { name: 'comparison-same', path: `${TEAM}/models/trainer-3r/comparison`, who: 'kofi' },
  { name: 'comparison-refused', path: `${TEAM}/models/skerry-7/comparison?tip=nothing_here`, who: 'tomas' },
  { name: 'reference-poses', path: `${TEAM}/models/skerry-7/revisions/2/reference-poses/1`, who: 'kofi' },
  { name: 'reference-poses-fail', path: `${TEAM}/models/skerry-7/revisions/1/reference-poses/1`, who: 'kofi' },
  { name: 'reference-poses-new', path: `${TEAM}/models/skerry-7/revisions/2/reference-poses/new`, who: 'ines' },
  { name: 'reference-poses-unstated', path: `${TEAM}/models/skerry-7/revisions/2/reference-poses/new`, who: 'ines', act: press('Check') },
  { name: 'reference-poses-reader', path: `${TEAM}/models/skerry-7/revisions/2/reference-poses/new`, who: 'kofi' },
  { name: 'source', path: `${TEAM}/models/dunlin-2/revisions/1/source`, who: 'ines' },
  { name: 'keys', path: `${TEAM}/keys`, who: 'mira' },
  { name: 'keys-new', path: `${TEAM}/keys`, who: 'mira', act: press('New key') },
  { name: 'keys-reader', path: `${TEAM}/keys`, who: 'kofi' },
]

for (const { name, path, who, act, expected: reported } of LOOKS) {
  for (const view of VIEWS) {
    test(`${name} is readable and accessible, ${view.name}`, async ({ page, context, scenario, expected }) => {
      if (reported !== undefined) expected.push(reported)
      if (who !== undefined) await holdSession(context, scenario, `${who}@tarnholm.example`)
      await open(page, view, path)
      await act?.(page)
      await look(page, view, name)
    })
  }
}
