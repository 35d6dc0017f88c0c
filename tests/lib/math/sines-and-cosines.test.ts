import { describe, expect, it } from 'vitest'
import { sinesAndCosines } from '@/lib/math/sines-and-cosines'
import { numbers } from '../kinematics/arms'

function of(angles: readonly number[], quarters: readonly number[] = angles.map(() => 0)): Float64Array {
  const out = new Float64Array(2 * angles.length)
  sinesAndCosines(Float64Array.from(angles), Int32Array.from(quarters), angles.length, out)
  return out
}

describe('sinesAndCosines', () => {
  it('is within two units of the last place of 1 of the engine, from 0 to a thousand million', () => {
    const random = numbers(5)
    for (const half of [1e-8, 1, 4, 100, 1e5, 1e6, 1e9]) {
      const angles = Array.from({ length: 20_000 }, () => half * (2 * random() - 1))
      const pairs = of(angles)
      let worst = 0
      angles.forEach((angle, i) => {
        worst = Math.max(worst, Math.abs(pairs[2 * i]! - Math.sin(angle)), Math.abs(pairs[2 * i + 1]! - Math.cos(angle)))
      })
      expect(worst).toBeLessThanOrEqual(Number.EPSILON)
    }
  })

  it('reduces the angles that are nearest to whole quarters without losing digits', () => {
    for (let k = -40; k <= 40; k++) {
      for (const near of [0, 1e-9, -1e-9]) {
        const angle = (k * Math.PI) / 2 + near
        const [sine, cosine] = of([angle])
        // Relative to what is small: the distance to the true multiple of π/2 keeps all its digits.
        expect(Math.abs(sine! - Math.sin(angle))).toBeLessThanOrEqual(4 * Number.EPSILON * Math.abs(Math.sin(angle)))
        expect(Math.abs(cosine! - Math.cos(angle))).toBeLessThanOrEqual(4 * Number.EPSILON * Math.abs(Math.cos(angle)))
      }
    }
  })

  it('turns on by whole quarters exactly', () => {
    expect(Array.from(of([0, 0, 0, 0, 0], [0, 1, 2, 3, -1]), (part) => part + 0)).toEqual([0, 1, 1, 0, 0, -1, -1, 0, -1, 0])
    const [sine, cosine] = of([0.3])
    expect(Array.from(of([0.3, 0.3, 0.3], [1, 2, 3]))).toEqual([cosine, -sine!, -sine!, -cosine!, -cosine!, sine])
    const far = of([3e8])
    expect(Array.from(of([3e8], [1]))).toEqual([far[1], -far[0]!])
  })

  it('gives NaN of what is not a number', () => {
    expect(Array.from(of([Number.NaN, Number.POSITIVE_INFINITY]))).toEqual([Number.NaN, Number.NaN, Number.NaN, Number.NaN])
  })
})
