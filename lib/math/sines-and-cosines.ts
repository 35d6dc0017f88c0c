/** Parts of a turn that the table holds; a quarter is 32 of them. */
const PARTS = 128
const PARTS_PER_RAD = PARTS / 2 / Math.PI
/** One part, π/64, in three pieces: the first two have 33 bits, so that a whole number of up to 20 bits times each is exact (Cody & Waite
 *  1980). */
const PART_1 = 1.5707963267341256 / 32
const PART_2 = 6.077100506303966e-11 / 32
const PART_3 = 2.0222662487959506e-21 / 32
/** Up to here (rad) that product is exact. */
const LARGEST = 5e4

// Taylor coefficients, with signs taken out.
const S3 = 1 / 6, S5 = 1 / 120, S7 = 1 / 5040
const C4 = 1 / 24, C6 = 1 / 720

/** Sine and cosine, in pairs, of each part of a turn. Made by the series and not by Math.sin, which need not give the same bits in every
 *  engine; those of whole quarters are exact. */
const TABLE = tabulate()

/** Fills `out` with sine and cosine, in pairs, of each of the first `count` angles (rad) turned on by a whole number of quarter turns,
 *  which is exact. What is left of an angle beside the nearest part of the table is below π/128, where a short series serves both, and
 *  the sum of angles does the rest: nothing depends on a branch. Within one unit of the last place of 1. */
export function sinesAndCosines(angles: Float64Array, quarters: Int32Array, count: number, out: Float64Array): void {
  for (let i = 0; i < count; i++) {
    const angle = angles[i]!
    if (!(Math.abs(angle) <= LARGEST)) {
      turnFar(angle, quarters[i]!, i, out)
      continue
    }
    const k = Math.floor(angle * PARTS_PER_RAD + 0.5)
    const first = angle - k * PART_1
    const second = k * PART_2
    const both = first - second
    const y = both - (k * PART_3 - (first - both - second))
    const z = y * y
    const sine = y - y * z * (S3 - z * (S5 - z * S7))
    const below = z * (0.5 - z * (C4 - z * C6))
    const at = (((k | 0) + (quarters[i]! << 5)) & (PARTS - 1)) << 1
    const s = TABLE[at]!, c = TABLE[at + 1]!
    out[2 * i] = s + (c * sine - s * below)
    out[2 * i + 1] = c - (s * sine + c * below)
  }
}

/** The same where the reduction above would lose digits; a number that is not finite gives NaN. */
function turnFar(angle: number, quarters: number, i: number, out: Float64Array): void {
  const s = Math.sin(angle)
  const c = Math.cos(angle)
  const odd = (quarters & 1) === 1
  out[2 * i] = (odd ? c : s) * (1 - (quarters & 2))
  out[2 * i + 1] = (odd ? s : c) * (1 - ((quarters + 1) & 2))
}

function tabulate(): Float64Array {
  const table = new Float64Array(2 * PARTS)
  for (let part = 0; part < PARTS; part++) {
    const quarter = Math.round(part / 32)
    const angle = (part - 32 * quarter) * (Math.PI / 64)
    const [s, c] = [series(angle, 1), series(angle, 0)]
    const odd = quarter & 1
    table[2 * part + odd] = s * (1 - ((quarter + odd) & 2)) + 0
    table[2 * part + 1 - odd] = c * (1 - ((quarter + 1 - odd) & 2)) + 0
  }
  return table
}

/** Taylor's series of the sine (from the power 1) or the cosine (from 0), within ±π/4, summed from its smallest term. */
function series(angle: number, from: number): number {
  let sum = 0
  for (let power = from + 24; power >= from; power -= 2) {
    let term = (power - from) % 4 === 0 ? 1 : -1
    for (let k = 1; k <= power; k++) term *= angle / k
    sum += term
  }
  return sum
}
