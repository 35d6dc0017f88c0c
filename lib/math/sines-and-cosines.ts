/** π/2 in three parts: the first two have 33 bits, so that a whole number of up to 20 bits times each is exact (Cody & Waite 1980). */
const QUARTER_1 = 1.5707963267341256
const QUARTER_2 = 6.077100506303966e-11
const QUARTER_3 = 2.0222662487959506e-21
const QUARTERS_PER_RAD = 2 / Math.PI
/** Up to here (rad) that product is exact. */
const LARGEST = 1e6

// Taylor coefficients, with signs taken out. On [−π/4, π/4] the first term left out is below a tenth of the last bit.
const S3 = 1 / 6, S5 = 1 / 120, S7 = 1 / 5040, S9 = 1 / 362880, S11 = 1 / 39916800, S13 = 1 / 6227020800, S15 = 1 / 1307674368000
const C4 = 1 / 24, C6 = 1 / 720, C8 = 1 / 40320, C10 = 1 / 3628800, C12 = 1 / 479001600, C14 = 1 / 87178291200, C16 = 1 / 20922789888000

/** Fills `out` with sine and cosine, in pairs, of each of the first `count` angles (rad) turned on by a whole number of quarter turns,
 *  which is exact. One reduction serves both, and the same angle gives the same bits in every engine, which Math.sin need not. */
export function sinesAndCosines(angles: Float64Array, quarters: Int32Array, count: number, out: Float64Array): void {
  for (let i = 0; i < count; i++) {
    const angle = angles[i]!
    if (!(Math.abs(angle) <= LARGEST)) {
      turnFar(angle, quarters[i]!, i, out)
      continue
    }
    const k = Math.floor(angle * QUARTERS_PER_RAD + 0.5)
    const first = angle - k * QUARTER_1
    const second = k * QUARTER_2
    const both = first - second
    const y = both - (k * QUARTER_3 - (first - both - second))
    const z = y * y
    const z2 = z * z
    const z4 = z2 * z2
    const s = y - y * z * (S3 - z * S5 + z2 * (S7 - z * S9) + z4 * (S11 - z * S13 + z2 * S15))
    const c = 1 - z * (0.5 - z * C4 + z2 * (C6 - z * C8) + z4 * (C10 - z * C12 + z2 * (C14 - z * C16)))
    const turns = (k + quarters[i]!) | 0
    // An odd number of quarters exchanges both; no branch, because which way it goes is as good as random.
    const odd = turns & 1
    out[2 * i + odd] = s * (1 - ((turns + 1) & 2))
    out[2 * i + 1 - odd] = c * (1 - (turns & 2))
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
