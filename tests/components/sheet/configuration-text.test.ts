import { describe, expect, it } from 'vitest'
import { addressOfConfiguration, configurationOfAddress, readConfiguration, textOfConfiguration } from '@/components/sheet/configuration-text'
import type { ChainJoint } from '@/lib/kinematics/chain'

const joint = (name: string, type: ChainJoint['type']): ChainJoint => ({ name, type, lower: null, upper: null, rate: null })
const JOINTS = [joint('rail', 'prismatic'), joint('elbow', 'revolute'), joint('flange', 'continuous')]
const SHOP = { length: 'mm', angle: 'deg' } as const
const SI = { length: 'm', angle: 'rad' } as const

describe('readConfiguration', () => {
  it('takes a bare number in the units shown', async () => {
    expect(await readConfiguration(JOINTS, '1500, 90, -180', SHOP)).toEqual([1.5, Math.PI / 2, -Math.PI])
    expect(await readConfiguration(JOINTS, '1.5 1 -2', SI)).toEqual([1.5, 1, -2])
  })

  it('takes a unit that was typed, whatever is shown', async () => {
    const values = await readConfiguration(JOINTS, '20 cm; −90°; 1.5 rad', SHOP)
    expect(values).toEqual([expect.closeTo(0.2, 14), expect.closeTo(-Math.PI / 2, 14), 1.5])
  })

  it('refuses a unit of another kind and names the joint', async () => {
    expect(await readConfiguration(JOINTS, '1, 20 mm, 0', SHOP)).toContain('elbow')
    expect(await readConfiguration(JOINTS, '1 deg, 20, 0', SHOP)).toContain('rail')
    expect(await readConfiguration(JOINTS, '1, many, 0', SHOP)).toContain('“many”')
  })

  it('says how many values are wanted, and how many there are', async () => {
    expect(await readConfiguration(JOINTS, '1, 2', SHOP)).toBe('Type 3 values separated by commas, one for each joint; there are 2.')
    expect(await readConfiguration(JOINTS, '  ', SHOP)).toContain('there are 0')
  })

  it('refuses what is beyond any machine', async () => expect(await readConfiguration(JOINTS, '1e40, 0, 0', SI)).toContain('too large'))
})

describe('a configuration in an address', () => {
  it('is degrees and millimetres, and comes back to the last digit shown', () => {
    const text = addressOfConfiguration(JOINTS, [1.5, Math.PI / 2, -1])
    expect(text).toBe('1500,90,-57.2957795131')
    const back = configurationOfAddress(JOINTS, text)!
    expect(back[0]).toBe(1.5)
    expect(back[1]).toBe(Math.PI / 2)
    expect(back[2]).toBeCloseTo(-1, 11)
  })

  it.each(['', '1,2', '1,2,3,4', '1,,3', '1,x,3', '1,Infinity,3', '1,1e300,3'])('is not read from %j', (text) => {
    expect(configurationOfAddress(JOINTS, text)).toBeNull()
  })
})

describe('textOfConfiguration', () => {
  it('shows no rounding of the change of units', () => {
    expect(textOfConfiguration(JOINTS, [0.35, (70 * Math.PI) / 180, 0], SHOP)).toBe('350, 70, 0')
  })
})
