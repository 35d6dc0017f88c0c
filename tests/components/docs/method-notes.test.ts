import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { METHOD_NOTES } from '@/components/docs/method-notes'

const ROOT = path.resolve(import.meta.dirname, '../../..')
const page = readFileSync(path.join(ROOT, 'app/docs/methods/page.tsx'), 'utf8')
const notes = Object.entries(METHOD_NOTES).flatMap(([section, all]) => all.map((note) => ({ section, ...note })))

/** The titles of the tests in a file, as they are written there. */
const titlesIn = (file: string) =>
  new Set([...readFileSync(path.join(ROOT, file), 'utf8').matchAll(/(?:\bit|\]\)|\bit\.each\(.*\))\('((?:[^'\\]|\\.)*)'/g)].map(([, title]) => title))

describe('the notes on the methods', () => {
  it('stand in every section of the page that has a method', () => {
    const sections = [...page.matchAll(/<h2 id="([\w-]+)">/g)].map(([, id]) => id!)
    expect(Object.keys(METHOD_NOTES).sort()).toEqual(sections.filter((id) => id !== 'sources').sort())
    for (const section of Object.keys(METHOD_NOTES)) expect(page).toContain(`<MethodNoteList of="${section}" />`)
  })

  it.each(notes)('name tests of $name that exist, word for word', ({ proofs }) => {
    expect(proofs.length).toBeGreaterThan(0)
    for (const { file, title } of proofs) expect([...titlesIn(file)]).toContain(title)
  })

  it.each(notes)('say units, use, cost and caution of $name in sentences', ({ units, use, cost, caution }) => {
    for (const sentence of [units, use, cost, caution]) expect(sentence).toMatch(/^[\p{L}0-9].*\.$/u)
  })
})

describe('the page on the methods', () => {
  it('cites by author and year what its list of sources has, and lists nothing that it does not cite', () => {
    const list = readFileSync(path.join(ROOT, 'components/docs/source-list.tsx'), 'utf8')
    const sources = [...list.matchAll(/^ {2}\['([^']+?) (\d{4})'/gm)].map(([, who, year]) => ({ first: who!.split(/,| and /)[0]!, year: year! }))
    expect(sources.length).toBeGreaterThan(10)
    const text = page.replace(/\s+|\{' '\}/g, ' ')
    for (const { first, year } of sources) expect(text, `${first} ${year}`).toMatch(new RegExp(`${first}\\b[^;()]*${year}|${first} and others ${year}`))
  })
})
