import { spawnSync } from 'node:child_process'
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Finding } from '@/lib/urdf/description'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import type { RuleId } from '@/lib/urdf/rules'
import { numbers } from '../lib/kinematics/arms'
import { BREAKAGES } from './breakages'
import { randomTree } from './random-tree'

/** check_urdf of Debian's liburdfdom-tools, which reads URDF 1.0 by the reference parser. */
const WITNESS = 'check_urdf'
/** Trees for each breakage: two with it alone, three with another one beside it. */
const ALONE = 2
const TREES = 5
/** The generator's first numbers hang together with a small seed. */
const WARMING_UP = 10

/** Refused here and not by the witness, by the rule of ours. */
const REFUSED_HERE: Partial<Record<RuleId, string>> = {
  'xml-malformed': 'its XML reader lets pass what XML 1.0 forbids: control characters, a lone ampersand, two hyphens in a comment',
  'encoding-unsupported': 'it takes bytes as they come; here names must be text',
  'doctype-refused': 'its XML reader skips the declaration; here none is accepted, because entities can',
  'text-after-robot': 'it stops reading behind the first element; here it must be clear which part is meant',
  'too-deep': 'it has no such bound',
  'name-too-long': 'it has no such bound',
  'joint-incomplete': 'it takes the first of two elements and says nothing',
  'two-parents': 'it keeps one of the two joints',
  cycle: 'it looks for a root only, and not at links that hang on none',
  'name-missing': 'it calls a link without a name by the empty name, and says so without refusing it',
  'axis-zero': 'it takes an axis without a direction, about which nothing can turn',
  'number-malformed': 'it has no bound on magnitudes; here placements end at 1e9',
  'limit-inverted': 'it does not compare the bounds',
  'mimic-missing': 'it does not look for the joint that is followed',
  'mimic-self': 'it does not look for the joint that is followed',
  'mimic-cycle': 'it does not look for the joint that is followed',
}

/** Accepted here and not by the witness, by what the witness says. */
const REFUSED_THERE: readonly (readonly [RegExp, string])[] = [
  [/joint limit: no (velocity|effort)/, 'URDF 1.0 demands both; here an unknown rate is a warning (rate-limit-unknown), and an effort does not enter'],
  [/No name given for the robot/, 'here a warning (robot-unnamed): nothing is computed from the name'],
  [/Invalid 'version' specified/, 'here a warning (version-unknown): the file is read as 1.0'],
  [/joint dynamics element specified with no damping and no friction/, 'dynamics do not enter kinematics'],
]

interface Judged {
  readonly name: string
  readonly findings: readonly Finding[]
  readonly isAccepted: boolean
  readonly witness: { readonly isAccepted: boolean; readonly words: string }
}

function judge(name: string, file: string): Judged {
  const { status, stdout, stderr, error } = spawnSync(WITNESS, [file], { encoding: 'utf8' })
  if (error !== undefined) throw new Error(`${WITNESS} is missing: install liburdfdom-tools. ${error.message}`)
  const { description, findings } = parseUrdf(readFileSync(file))
  return { name, findings, isAccepted: description !== null, witness: { isAccepted: status === 0, words: stderr + stdout } }
}

/** The rows of the tables that explain a disagreement; empty where one is not listed. */
function explanations({ findings, isAccepted, witness }: Judged): string[] {
  if (isAccepted) return REFUSED_THERE.filter(([words]) => words.test(witness.words)).map(([words]) => words.source)
  const errors = [...new Set(findings.filter(({ severity }) => severity === 'error').map(({ rule }) => rule))]
  return errors.every((rule) => rule in REFUSED_HERE) ? errors : []
}

const disagree = ({ isAccepted, witness }: Judged): boolean => isAccepted !== witness.isAccepted
const unlisted = (judged: readonly Judged[]) =>
  judged.filter((one) => disagree(one) && explanations(one).length === 0).map(({ name, findings, witness }) => [name, findings.map(({ rule }) => rule), witness.words.slice(0, 200)])

const random = (seed: number): (() => number) => {
  const next = numbers(seed)
  for (let i = 0; i < WARMING_UP; i++) next()
  return next
}

describe('accepting and refusing, against the reference parser', () => {
  let folder: string
  let trees: Judged[]
  beforeAll(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'check-'))
    const kinds = Object.keys(BREAKAGES)
    trees = kinds.flatMap((kind, k) =>
      Array.from({ length: TREES }, (_unused, i) => {
        const seed = 100 * k + i + 1
        const next = random(seed)
        const beside = i < ALONE ? 'nothing at all' : kinds[Math.floor(kinds.length * next())]!
        const urdf = BREAKAGES[beside]!(BREAKAGES[kind]!(randomTree(seed).urdf, next), next)
        const file = path.join(folder, 'tree.urdf')
        writeFileSync(file, urdf, kind.includes('not UTF-8') || beside.includes('not UTF-8') ? 'latin1' : 'utf8')
        return judge(`${kind}, ${beside} (seed ${seed})`, file)
      }),
    )
  })
  afterAll(() => rmSync(folder, { recursive: true, force: true }))

  it('agrees on every sample, or the tables say why not', () => {
    const files = ['samples', 'tests/reference/arms'].flatMap((place) => readdirSync(place).filter((name) => name.endsWith('.urdf')).map((name) => path.join(place, name)))
    expect(files.length).toBeGreaterThan(8)
    expect(unlisted(files.map((file) => judge(file, file)))).toEqual([])
  })

  it('agrees on every one of more than 300 drawn trees, whole and broken, or the tables say why not', () => {
    expect(trees.length).toBeGreaterThan(300)
    expect(unlisted(trees)).toEqual([])
  })

  it('agrees on most of them without a table, both accepting and refusing', () => {
    const agreed = trees.filter((one) => !disagree(one))
    expect(agreed.filter(({ isAccepted }) => isAccepted).length).toBeGreaterThan(60)
    expect(agreed.filter(({ isAccepted }) => !isAccepted).length).toBeGreaterThan(60)
  })

  it('needs every row of the tables', () => {
    const used = new Set(trees.filter(disagree).flatMap(explanations))
    const rows = [...Object.keys(REFUSED_HERE), ...REFUSED_THERE.map(([words]) => words.source)]
    expect(rows.filter((row) => !used.has(row))).toEqual([])
  })
})
