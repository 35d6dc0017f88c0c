import { describe, expect, it } from 'vitest'
import { PosesFields, questionOf } from '@/components/evidence/poses-fields'
import { ReferencePosesQuestion } from '@/lib/contract/reference-poses'

const filled: PosesFields = {
  table: '1,2,3',
  units: 'mm-deg',
  rotation: 'fixed-xyz',
  measuredAt: 'tip',
  tool: '',
  position: '0.5',
  orientation: '0,1',
  base: '',
  tip: '',
  note: '',
}

const faults = (change: Partial<PosesFields>) => PosesFields.safeParse({ ...filled, ...change }).error?.issues.map(({ path }) => path.join('.')) ?? []

describe('the form of reference poses', () => {
  it.each([
    [{}, []],
    [{ table: ' \n' }, ['table']],
    [{ units: '' }, ['units']],
    [{ rotation: '' }, ['rotation']],
    [{ rotation: 'toString' }, ['rotation']],
    [{ measuredAt: '' }, ['measuredAt']],
    [{ position: '0' }, ['position']],
    [{ orientation: 'small' }, ['orientation']],
    [{ measuredAt: 'tool', tool: '1 2 3' }, ['tool']],
    [{ measuredAt: 'tool', tool: '0 0 120 0 0 0 1' }, []],
  ])('with %j is at fault in %j', (change, fields) => expect(faults(change)).toEqual(fields))

  it('asks a question that the contract takes, and leaves out what is empty', () => {
    const question = questionOf(filled)
    expect(question).toEqual({ table: '1,2,3', units: { length: 'mm', angle: 'deg' }, rotation: 'fixed-xyz', tool: null, tolerance: { position: 0.5, orientation: 0.1 } })
    expect(ReferencePosesQuestion.parse(question)).toEqual(question)
  })

  it('reads the tool and the chain', () => {
    const question = questionOf({ ...filled, measuredAt: 'tool', tool: '0; 0; 120,5; 0; 0; 0; 1', tip: 'flange', note: 'Arm warm.' })
    expect(question).toMatchObject({ tool: { position: [0, 0, 120.5], quaternion: [0, 0, 0, 1] }, chain: { tip: 'flange' }, note: 'Arm warm.' })
  })
})
