import { describe, expect, it } from 'vitest'
import { rollPitchYawOf } from '@/components/sheet/roll-pitch-yaw-of'
import { structureRows } from '@/components/sheet/structure-rows'
import type { Joint } from '@/lib/contract/description'
import { quaternionOf } from '@/lib/math/quaternion'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'

const joint = (parent: string, child: string): Joint => ({ name: `${parent} ${child}`, type: 'fixed', parent, child, origin: { position: [0, 0, 0], quaternion: [0, 0, 0, 1] } })

describe('structureRows', () => {
  it('puts every link under its parent, children by name', () => {
    const rows = structureRows('base', [joint('arm', 'tool'), joint('base', 'camera'), joint('base', 'arm')])
    expect(rows.map(({ link, depth }) => [link, depth])).toEqual([['base', 0], ['arm', 1], ['tool', 2], ['camera', 1]])
  })

  it('walks a chain of 20 000 links', () => {
    const joints = Array.from({ length: 20_000 }, (_, i) => joint(`l${i}`, `l${i + 1}`))
    expect(structureRows('l0', joints).at(-1)).toMatchObject({ link: 'l20000', depth: 20_000 })
  })

  it('keeps links whose names are those of object members', () => {
    expect(structureRows('__proto__', [joint('__proto__', 'constructor')]).map(({ link }) => link)).toEqual(['__proto__', 'constructor'])
  })
})

describe('rollPitchYawOf', () => {
  it.each([
    [0.3, -0.4, 1.2],
    [-3, 1.5, -3.1],
    [0, Math.PI / 2, 0.7],
    [0, -Math.PI / 2, -2],
  ])('gives back the rotation of roll %d, pitch %d, yaw %d', (...rpy) => {
    // The witness builds the matrix from the angles; the two meet only in the rotation.
    const turned = transformOfRollPitchYaw([0, 0, 0], rpy)
    const again = transformOfRollPitchYaw([0, 0, 0], rollPitchYawOf(quaternionOf(turned)))
    turned.forEach((value, i) => expect(again[i]).toBeCloseTo(value, 6))
  })
})
