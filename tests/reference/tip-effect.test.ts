import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { commonGround } from '@/lib/compute/comparison/common-ground'
import { matchElements } from '@/lib/compute/comparison/match-elements'
import { tipEffect } from '@/lib/compute/comparison/tip-effect'
import { finishInSlices } from '@/lib/in-slices'
import { seededConfigurations } from '@/lib/kinematics/seeded-configurations'
import { compileChain } from '@/lib/urdf/compile-chain'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { askPython } from './ask-python'

const samples = path.resolve(import.meta.dirname, '../../samples')
const folder = mkdtempSync(path.join(tmpdir(), 'elbowroom-effect-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

const nominal = path.join(samples, 'skerry-7.urdf')

/** The seven-axis arm with a link that is bent and an axis that is crooked, so that the tip turns as well. */
function bentArm(): string {
  const text = readFileSync(nominal, 'utf8')
    .replace('<origin xyz="0 0 0.35"/>', '<origin xyz="0.0002 0 0.3504" rpy="0.002 -0.001 0.0015"/>')
    .replace('<axis xyz="0 1 0"/>', '<axis xyz="0.001 1 0"/>')
  const file = path.join(folder, 'bent.urdf')
  writeFileSync(file, text)
  return file
}

const largest = (values: readonly number[]) => values.reduce((most, value) => Math.max(most, value), 0)
const meanOf = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length

describe('the effect at the tip of a seven-axis arm', () => {
  it.each([
    ['calibrated', () => path.join(samples, 'skerry-7-revision-2.urdf')],
    ['bent', bentArm],
  ])("agrees with NumPy's for the %s one", async (_what, fileOf) => {
    const files = [nominal, fileOf()] as const
    const [earlier, later] = files.map((file) => parseUrdf(readFileSync(file)).description!) as [NonNullable<ReturnType<typeof parseUrdf>['description']>, NonNullable<ReturnType<typeof parseUrdf>['description']>]
    const { joints } = await finishInSlices(matchElements(earlier, later))
    const [from, to] = [compileChain(earlier), compileChain(later)]
    const ground = commonGround(from, to, joints)
    const effect = await tipEffect(from, to, ground)
    const configurations = seededConfigurations({ ...to, joints: ground.joints }, effect.samples, effect.seed).map((q) => Array.from(q))
    const theirs = askPython<{ distances: number[]; angles: number[]; percentiles: [number, number] }>('tip-effect.py', {
      files,
      base: to.base,
      tip: to.tip,
      joints: ground.joints.map(({ name }) => name),
      configurations,
    })
    const measures = [
      { ours: effect.translation, theirs: theirs.distances, p95: theirs.percentiles[0] },
      { ours: effect.rotation, theirs: theirs.angles, p95: theirs.percentiles[1] },
    ]
    expect(theirs.distances).toHaveLength(2000)
    for (const measure of measures) {
      expect(Math.abs(measure.ours.max - largest(measure.theirs))).toBeLessThan(1e-13)
      expect(Math.abs(measure.ours.mean - meanOf(measure.theirs))).toBeLessThan(1e-13)
      expect(Math.abs(measure.ours.p95 - measure.p95)).toBeLessThan(1e-13)
    }
    const place = measures[0]!.theirs.indexOf(largest(measures[0]!.theirs))
    expect(effect.translation.worst).toEqual(configurations[place])
  }, 60_000)
})
