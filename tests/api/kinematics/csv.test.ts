import { describe, expect, it } from 'vitest'
import { importModel } from '../import-model'
import { QUESTIONS, type Question } from './ask'
import { askRecords, atPath, CSV_TYPE, readCsv } from './records'

/** Poses that differ in rank, in what is violated and in what there is to say: bent, stretched out, and beyond the limits. */
const CONFIGURATIONS = [[0, -0.6, 0, 1.2, 0, 0.8, 0], [0, 0, 0, 0, 0, 0, 0], [9, -0.6, 0, 9, 0, 0.8, 0.123456789012345]]
const TARGETS = [{ position: [0.35, 0.05, 0.6], quaternion: [0, 0.7071067811865476, 0, 0.7071067811865476] }, { position: [9, 0, 0], quaternion: [0, 0, 0, 1] }]

const ASKED: Readonly<Record<Question, object>> = {
  'forward-kinematics': { configurations: CONFIGURATIONS, links: ['link_3'], matrices: true },
  jacobian: { configurations: CONFIGURATIONS },
  'null-space': { configurations: CONFIGURATIONS, include: ['rank', 'nullity', 'singularValues', 'basis', 'lostDirections', 'projector'] },
  'joint-rates': { configurations: CONFIGURATIONS, twists: [[0.5, 0.1, 0.2, 0, 0.3, 0]], secondary: [{ objective: 'mid-range', gain: 9 }] },
  'inverse-kinematics': { targets: TARGETS, seeds: [CONFIGURATIONS[0]], attempts: 2 },
}

/** Every path to a number, text, truth value, null or empty list within a result. */
const pathsIn = (value: unknown, path: string): string[] =>
  typeof value === 'object' && value !== null && Object.keys(value).length > 0
    ? Object.entries(value).flatMap(([name, inner]) => pathsIn(inner, path === '' ? name : `${path}.${name}`))
    : [path]

const isEmpty = (value: unknown) => value === undefined || value === null || (Array.isArray(value) && value.length === 0)

describe.each(QUESTIONS)('%s as CSV', (question) => {
  it('has a record for each result and a cell for each value, the same to the last bit', async () => {
    const inJson = await askRecords({ question, json: ASKED[question] })
    const inCsv = await askRecords({ question, json: ASKED[question], accept: CSV_TYPE })
    expect([inCsv.status, inCsv.headers.get('content-type')]).toEqual([200, 'text/csv; charset=utf-8; header=present'])
    const { results } = inJson.json() as { results: unknown[] }
    const [header, ...rows] = readCsv(inCsv.text)
    expect(rows).toHaveLength(results.length)
    for (const [i, row] of rows.entries()) {
      expect(row).toHaveLength(header!.length)
      for (const [k, path] of header!.entries()) {
        const value = atPath(results[i], path)
        const cell = row[k]!
        if (isEmpty(value)) expect(cell, path).toBe('')
        else expect(typeof value === 'number' ? Number(cell) : cell, path).toEqual(typeof value === 'number' ? value : String(value))
      }
    }
    // Nothing is left out, nothing stands twice, and every line ends as RFC 4180 has it.
    const paths = new Set(results.flatMap((result) => pathsIn(result, '')))
    for (const path of paths) expect(header!.some((column) => column === path || column.startsWith(`${path}.`)), path).toBe(true)
    expect(new Set(header).size).toBe(header!.length)
    expect(inCsv.text.endsWith('\r\n')).toBe(true)
    expect(inCsv.text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/)
  })

  it('says of the model, the chain and the units in fields what the JSON says', async () => {
    const asked = { ...ASKED[question], ...(question === 'inverse-kinematics' ? {} : { units: { length: 'mm' } }) }
    const { model, chain, units } = (await askRecords({ question, json: asked })).json() as { model: Record<string, unknown>; chain: { base: string; tip: string }; units: Record<string, string> }
    const { headers } = await askRecords({ question, json: asked, accept: CSV_TYPE })
    expect(headers.get('model-fingerprint')).toBe(model.fingerprint)
    expect(headers.get('model-revision')).toBe(`1;team="tarnholm";model="skerry-7";status=${String(model.status)}`)
    expect(headers.get('record-chain')).toBe(`base="${chain.base}", tip="${chain.tip}", joints=7`)
    expect(headers.get('record-units')).toBe(`length=${units.length}, angle=${units.angle}`)
    expect(headers.get('vary')!.split(', ')).toContain('Accept')
    expect([headers.get('link'), headers.get('cache-control')]).toEqual(['</docs/cautions>; rel="help"', 'no-store'])
  })
})

describe('the columns of CSV', () => {
  const headerOf = async (question: Question, json: object, model = 'skerry-7') => readCsv((await askRecords({ question, model, json, accept: CSV_TYPE })).text)[0]!

  it('stand in the order of the fields, lists from their first entry on', async () => {
    expect(await headerOf('forward-kinematics', { configurations: [[0, 0, 0]], include: ['withinLimits', 'pose'] }, 'trainer-3r')).toEqual([
      'pose.position.0', 'pose.position.1', 'pose.position.2', 'pose.quaternion.0', 'pose.quaternion.1', 'pose.quaternion.2', 'pose.quaternion.3', 'withinLimits',
    ])
  })

  it('are all that some result has, with empty cells in the others', async () => {
    const { text } = await askRecords({ question: 'null-space', json: { configurations: CONFIGURATIONS.slice(0, 2), include: ['nullity', 'lostDirections'] }, accept: CSV_TYPE })
    const [header, bent, stretched] = readCsv(text)
    expect([header![0], header![1], header!.at(-1)]).toEqual(['nullity', 'lostDirections.0.direction.0', expect.stringMatching(/^lostDirections\.\d\.structural$/)])
    expect([bent![0], new Set(bent!.slice(1))]).toEqual(['1', new Set([''])])
    expect(Number(stretched![0])).toBeGreaterThan(1)
    expect(stretched!.slice(1, 8)).not.toContain('')
  })

  it('are at least one for each field that was asked for, by its own name', async () => {
    const { text } = await askRecords({ question: 'joint-rates', model: 'trainer-3r', json: { configurations: [[0.3, 0.4, 0.5], [0.3, 0.4, 0.6]], twists: [[0, 0, 0, 0, 0, 0]], task: { components: ['vx', 'vy'] }, include: ['saturated', 'diagnosis'] }, accept: CSV_TYPE })
    expect(text).toBe('saturated,diagnosis\r\n,\r\n,\r\n')
  })

  it('name each part of a diagnosis in the order of the contract', async () => {
    const header = await headerOf('joint-rates', { ...ASKED['joint-rates'], include: ['diagnosis'] })
    const first = header.filter((name) => name.startsWith('diagnosis.0.')).map((name) => name.split('.')[2]!)
    const order = ['code', 'detail', 'direction', 'joint']
    expect([...new Set(first)]).toEqual(order.filter((part) => first.includes(part)))
    expect(first.slice(0, 2)).toEqual(['code', 'detail'])
  })
})

describe('text in CSV', () => {
  it('is quoted where it has to be, and kept from being computed by a spreadsheet; numbers are not touched', async () => {
    const link = (name: string) => `<link name="${name}"/>`
    const names = ['=1+2', '@tip, &quot;b&quot;', '+c', '-d']
    const joints = names.map((name, i) => {
      const limit = '<limit lower="0.1" upper="1" effort="1" velocity="1"/>'
      return `<joint name="j${name}" type="revolute"><parent link="${i === 0 ? 'root' : names[i - 1]!}"/><child link="${name}"/><axis xyz="0 0 1"/>${limit}</joint>`
    })
    const { model } = await importModel('Names like formulas', `<robot name="r">${link('root')}${names.map(link).join('')}${joints.join('')}</robot>`)
    const { text, status } = await askRecords({
      question: 'forward-kinematics', model: model.slug, accept: CSV_TYPE,
      json: { configurations: [[-0.5, -0.5, -0.5, -0.5]], links: ['=1+2', '@tip, "b"', '+c', '-d'], include: ['links', 'violations'] },
    })
    expect(status, text).toBe(200)
    const [header, row] = readCsv(text)
    const cell = (path: string) => row![header!.indexOf(path)]
    expect([0, 1, 2, 3].map((i) => cell(`links.${i}.link`))).toEqual(["'=1+2", `'@tip, "b"`, "'+c", "'-d"])
    expect(text).toContain(`,"'@tip, ""b""",`)
    expect(cell('violations.0.joint')).toBe('j=1+2')
    expect(cell('violations.0.value')).toBe('-0.5')
  })
})
