/** Up to this spread of J·Jᵀ + λ²·I (its trace over λ²) one correction leaves no more error than a factorisation of J itself would. */
const WIDEST = 1e6

/** rates = Jᵀ·(J·Jᵀ + λ²·I)⁻¹·b for a row-major 6 x n matrix J, λ > 0 and 6 numbers b: by L·D·Lᵀ on the 6 x 6 square, written out, and one
 *  correction by the residual, which is taken through J and not through the square (corrected semi-normal equations, Björck 1987, from
 *  memory). False, and nothing filled, where λ is too small beside J for that. */
export function dampedSix(j: Float64Array, n: number, lambda: number, b: Float64Array, rates: Float64Array): boolean {
  const squared = lambda * lambda
  // The square, aᵢₖ = row i · row k, lower triangle.
  let a11 = 0, a21 = 0, a22 = 0, a31 = 0, a32 = 0, a33 = 0, a41 = 0, a42 = 0, a43 = 0, a44 = 0, a51 = 0
  let a52 = 0, a53 = 0, a54 = 0, a55 = 0, a61 = 0, a62 = 0, a63 = 0, a64 = 0, a65 = 0, a66 = 0
  for (let c = 0; c < n; c++) {
    const j1 = j[c]!, j2 = j[n + c]!, j3 = j[2 * n + c]!, j4 = j[3 * n + c]!, j5 = j[4 * n + c]!, j6 = j[5 * n + c]!
    a11 += j1 * j1
    a21 += j2 * j1
    a22 += j2 * j2
    a31 += j3 * j1
    a32 += j3 * j2
    a33 += j3 * j3
    a41 += j4 * j1
    a42 += j4 * j2
    a43 += j4 * j3
    a44 += j4 * j4
    a51 += j5 * j1
    a52 += j5 * j2
    a53 += j5 * j3
    a54 += j5 * j4
    a55 += j5 * j5
    a61 += j6 * j1
    a62 += j6 * j2
    a63 += j6 * j3
    a64 += j6 * j4
    a65 += j6 * j5
    a66 += j6 * j6
  }
  if (!(a11 + a22 + a33 + a44 + a55 + a66 < WIDEST * squared)) return false
  // L (lᵢₖ) and 1/D (eₖ); uᵢₖ = lᵢₖ·dₖ.
  const e1 = 1 / (a11 + squared)
  const u21 = a21, l21 = u21 * e1
  const u31 = a31, l31 = u31 * e1
  const u41 = a41, l41 = u41 * e1
  const u51 = a51, l51 = u51 * e1
  const u61 = a61, l61 = u61 * e1
  const e2 = 1 / (a22 + squared - l21 * u21)
  const u32 = a32 - l31 * u21, l32 = u32 * e2
  const u42 = a42 - l41 * u21, l42 = u42 * e2
  const u52 = a52 - l51 * u21, l52 = u52 * e2
  const u62 = a62 - l61 * u21, l62 = u62 * e2
  const e3 = 1 / (a33 + squared - l31 * u31 - l32 * u32)
  const u43 = a43 - l41 * u31 - l42 * u32, l43 = u43 * e3
  const u53 = a53 - l51 * u31 - l52 * u32, l53 = u53 * e3
  const u63 = a63 - l61 * u31 - l62 * u32, l63 = u63 * e3
  const e4 = 1 / (a44 + squared - l41 * u41 - l42 * u42 - l43 * u43)
  const u54 = a54 - l51 * u41 - l52 * u42 - l53 * u43, l54 = u54 * e4
  const u64 = a64 - l61 * u41 - l62 * u42 - l63 * u43, l64 = u64 * e4
  const e5 = 1 / (a55 + squared - l51 * u51 - l52 * u52 - l53 * u53 - l54 * u54)
  const u65 = a65 - l61 * u51 - l62 * u52 - l63 * u53 - l64 * u54, l65 = u65 * e5
  const e6 = 1 / (a66 + squared - l61 * u61 - l62 * u62 - l63 * u63 - l64 * u64 - l65 * u65)
  let y1 = 0, y2 = 0, y3 = 0, y4 = 0, y5 = 0, y6 = 0
  let r1 = b[0]!, r2 = b[1]!, r3 = b[2]!, r4 = b[3]!, r5 = b[4]!, r6 = b[5]!
  for (let pass = 0; pass < 2; pass++) {
    // y += (L·D·Lᵀ)⁻¹·r
    const f1 = r1
    const f2 = r2 - l21 * f1
    const f3 = r3 - l31 * f1 - l32 * f2
    const f4 = r4 - l41 * f1 - l42 * f2 - l43 * f3
    const f5 = r5 - l51 * f1 - l52 * f2 - l53 * f3 - l54 * f4
    const f6 = r6 - l61 * f1 - l62 * f2 - l63 * f3 - l64 * f4 - l65 * f5
    const g6 = f6 * e6
    const g5 = f5 * e5 - l65 * g6
    const g4 = f4 * e4 - l54 * g5 - l64 * g6
    const g3 = f3 * e3 - l43 * g4 - l53 * g5 - l63 * g6
    const g2 = f2 * e2 - l32 * g3 - l42 * g4 - l52 * g5 - l62 * g6
    const g1 = f1 * e1 - l21 * g2 - l31 * g3 - l41 * g4 - l51 * g5 - l61 * g6
    y1 += g1
    y2 += g2
    y3 += g3
    y4 += g4
    y5 += g5
    y6 += g6
    // r = b − λ²·y − J·Jᵀ·y
    r1 = b[0]! - squared * y1
    r2 = b[1]! - squared * y2
    r3 = b[2]! - squared * y3
    r4 = b[3]! - squared * y4
    r5 = b[4]! - squared * y5
    r6 = b[5]! - squared * y6
    for (let c = 0; c < n; c++) {
      const j1 = j[c]!, j2 = j[n + c]!, j3 = j[2 * n + c]!, j4 = j[3 * n + c]!, j5 = j[4 * n + c]!, j6 = j[5 * n + c]!
      const rate = j1 * y1 + j2 * y2 + j3 * y3 + j4 * y4 + j5 * y5 + j6 * y6
      rates[c] = rate
      r1 -= j1 * rate
      r2 -= j2 * rate
      r3 -= j3 * rate
      r4 -= j4 * rate
      r5 -= j5 * rate
      r6 -= j6 * rate
    }
  }
  return true
}
