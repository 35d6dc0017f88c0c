import { describe, expect, it } from 'vitest'
import { createTask, type TwistComponent } from '@/lib/kinematics/task'
import { directionWords } from '@/lib/kinematics/direction-words'

describe('createTask', () => {
  it('brings components into twist order, each once', () => {
    expect(createTask(['wz', 'vx', 'wz'], 'tip')).toEqual({ components: ['vx', 'wz'], frame: 'tip', rows: [0, 5] })
  })

  it('asks for the whole twist in base axes when nothing is said', () => {
    expect(createTask()).toEqual({ components: ['vx', 'vy', 'vz', 'wx', 'wy', 'wz'], frame: 'base', rows: [0, 1, 2, 3, 4, 5] })
  })

  it('refuses no component and an unknown one', () => {
    expect(() => createTask([])).toThrow('at least one component')
    expect(() => createTask(['vw' as TwistComponent])).toThrow("named 'vw'")
  })
})

describe('directionWords', () => {
  it.each([
    [[1, 0, 0, 0, 0, 0], 'base', 'move along x of the base'],
    [[0, 0, -1, 0, 0, 0], 'tip', 'move along z of the tool'],
    [[0, 0, 0, 0, 1, 9e-4], 'base', 'turn about y of the base'],
    [[0, 0.8, 0, 0, 0, -0.6], 'tip', 'move in the direction (vy 0.800, wz -0.600) in the axes of the tool'],
    [[Math.sqrt(1 - 4e-6), 2e-3, 0, 0, 0, 0], 'base', 'move in the direction (vx 1.000, vy 0.002) in the axes of the base'],
  ] as const)('says %s in %s axes as what the tool would do', (direction, frame, words) => {
    expect(directionWords(direction, frame)).toBe(words)
  })
})
