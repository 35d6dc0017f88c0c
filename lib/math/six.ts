import { fillTwist } from './twist-columns'

/** J·Jᵀ + λ²·I = L·D·Lᵀ of a row-major 6 x n matrix J, written out: a task of six components is what nearly everyone asks, and a loop over
 *  six costs twice the time. All of it goes through the square of J, whose rounding grows with the square of J's condition; where that
 *  is felt a solution is corrected by its residual, which is taken through J itself (corrected semi-normal equations, Björck 1987, from
 *  memory). */
export interface SixFactors {
  /** lᵢₖ by rows (15), then 1/dₖ (6). */
  readonly parts: Float64Array
  /** λ², the trace of J·Jᵀ, and, where asked for, that of (J·Jᵀ + λ²·I)⁻¹. */
  readonly sizes: Float64Array
  /** What is left over of two right hand sides, 6 numbers each. */
  readonly rest: Float64Array
}

/** Room for the factors. */
export function createSixFactors(): SixFactors {
  return { parts: new Float64Array(21), sizes: new Float64Array(3), rest: new Float64Array(12) }
}

/** Fills the factors of J·Jᵀ + λ²·I; `squared` is λ². What is not positive makes them not finite. */
export function factorSix(j: Float64Array, n: number, squared: number, { parts, sizes }: SixFactors): void {
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
  // lᵢₖ and eₖ = 1/dₖ; uᵢₖ = lᵢₖ·dₖ.
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
  sizes[0] = squared
  sizes[1] = a11 + a22 + a33 + a44 + a55 + a66
  parts[0] = l21
  parts[1] = l31
  parts[2] = l32
  parts[3] = l41
  parts[4] = l42
  parts[5] = l43
  parts[6] = l51
  parts[7] = l52
  parts[8] = l53
  parts[9] = l54
  parts[10] = l61
  parts[11] = l62
  parts[12] = l63
  parts[13] = l64
  parts[14] = l65
  parts[15] = e1
  parts[16] = e2
  parts[17] = e3
  parts[18] = e4
  parts[19] = e5
  parts[20] = e6
}

/** Fills the trace of (J·Jᵀ + λ²·I)⁻¹, which is at least its norm and at most six times that. */
export function fillInverseTrace({ parts, sizes }: SixFactors): void {
  const l21 = parts[0]!
  const l31 = parts[1]!, l32 = parts[2]!
  const l41 = parts[3]!, l42 = parts[4]!, l43 = parts[5]!
  const l51 = parts[6]!, l52 = parts[7]!, l53 = parts[8]!, l54 = parts[9]!
  const l61 = parts[10]!, l62 = parts[11]!, l63 = parts[12]!, l64 = parts[13]!, l65 = parts[14]!
  // mᵢₖ: the inverse of L.
  const m21 = -l21
  const m31 = -l31 - l32 * m21
  const m32 = -l32
  const m41 = -l41 - l42 * m21 - l43 * m31
  const m42 = -l42 - l43 * m32
  const m43 = -l43
  const m51 = -l51 - l52 * m21 - l53 * m31 - l54 * m41
  const m52 = -l52 - l53 * m32 - l54 * m42
  const m53 = -l53 - l54 * m43
  const m54 = -l54
  const m61 = -l61 - l62 * m21 - l63 * m31 - l64 * m41 - l65 * m51
  const m62 = -l62 - l63 * m32 - l64 * m42 - l65 * m52
  const m63 = -l63 - l64 * m43 - l65 * m53
  const m64 = -l64 - l65 * m54
  const m65 = -l65
  sizes[2] =
    parts[15]! +
    parts[16]! * (1 + m21 * m21) +
    parts[17]! * (1 + m31 * m31 + m32 * m32) +
    parts[18]! * (1 + m41 * m41 + m42 * m42 + m43 * m43) +
    parts[19]! * (1 + m51 * m51 + m52 * m52 + m53 * m53 + m54 * m54) +
    parts[20]! * (1 + m61 * m61 + m62 * m62 + m63 * m63 + m64 * m64 + m65 * m65)
}

/** rates = Jᵀ·(J·Jᵀ + λ²·I)⁻¹·b for 6 numbers b, with `corrections` of it. */
export function solveSix(j: Float64Array, n: number, factors: SixFactors, b: Float64Array, rates: Float64Array, corrections: number): void {
  const { rest, sizes } = factors
  const squared = sizes[0]!
  let y1 = 0, y2 = 0, y3 = 0, y4 = 0, y5 = 0, y6 = 0
  for (let i = 0; i < 6; i++) rest[i] = b[i]!
  for (let left = corrections; ; left--) {
    backSix(factors, 0)
    y1 += rest[0]!
    y2 += rest[1]!
    y3 += rest[2]!
    y4 += rest[3]!
    y5 += rest[4]!
    y6 += rest[5]!
    if (left === 0) {
      for (let c = 0; c < n; c++) {
        rates[c] = j[c]! * y1 + j[n + c]! * y2 + j[2 * n + c]! * y3 + j[3 * n + c]! * y4 + j[4 * n + c]! * y5 + j[5 * n + c]! * y6
      }
      return
    }
    // What is left: b − λ²·y − J·Jᵀ·y.
    let r1 = b[0]! - squared * y1, r2 = b[1]! - squared * y2, r3 = b[2]! - squared * y3, r4 = b[3]! - squared * y4, r5 = b[4]! - squared * y5, r6 = b[5]! - squared * y6
    for (let c = 0; c < n; c++) {
      const j1 = j[c]!, j2 = j[n + c]!, j3 = j[2 * n + c]!, j4 = j[3 * n + c]!, j5 = j[4 * n + c]!, j6 = j[5 * n + c]!
      const rate = j1 * y1 + j2 * y2 + j3 * y3 + j4 * y4 + j5 * y5 + j6 * y6
      r1 -= j1 * rate
      r2 -= j2 * rate
      r3 -= j3 * rate
      r4 -= j4 * rate
      r5 -= j5 * rate
      r6 -= j6 * rate
    }
    rest[0] = r1
    rest[1] = r2
    rest[2] = r3
    rest[3] = r4
    rest[4] = r5
    rest[5] = r6
  }
}

/** vector = (I − Jᵀ·(J·Jᵀ)⁻¹·J)·vector for factors with λ = 0, and `corrections` times again, which takes out what rounding has left. */
export function projectSix(j: Float64Array, n: number, factors: SixFactors, vector: Float64Array, corrections: number): void {
  const { rest } = factors
  for (let pass = 0; pass <= corrections; pass++) {
    fillTwist(j, vector, rest)
    backSix(factors, 0)
    const y1 = rest[0]!, y2 = rest[1]!, y3 = rest[2]!, y4 = rest[3]!, y5 = rest[4]!, y6 = rest[5]!
    for (let c = 0; c < n; c++) {
      const j1 = j[c]!, j2 = j[n + c]!, j3 = j[2 * n + c]!, j4 = j[3 * n + c]!, j5 = j[4 * n + c]!, j6 = j[5 * n + c]!
      vector[c]! -= j1 * y1 + j2 * y2 + j3 * y3 + j4 * y4 + j5 * y5 + j6 * y6
    }
  }
}

/** Both of that without corrections, at once: rates = Jᵀ·(J·Jᵀ)⁻¹·b, and `vector` projected. */
export function solveAndProjectSix(j: Float64Array, n: number, factors: SixFactors, b: Float64Array, rates: Float64Array, vector: Float64Array): void {
  const { rest } = factors
  fillTwist(j, vector, rest)
  for (let i = 0; i < 6; i++) rest[6 + i] = b[i]!
  backSix(factors, 0)
  backSix(factors, 6)
  const z1 = rest[0]!, z2 = rest[1]!, z3 = rest[2]!, z4 = rest[3]!, z5 = rest[4]!, z6 = rest[5]!
  const y1 = rest[6]!, y2 = rest[7]!, y3 = rest[8]!, y4 = rest[9]!, y5 = rest[10]!, y6 = rest[11]!
  for (let c = 0; c < n; c++) {
    const j1 = j[c]!, j2 = j[n + c]!, j3 = j[2 * n + c]!, j4 = j[3 * n + c]!, j5 = j[4 * n + c]!, j6 = j[5 * n + c]!
    rates[c] = j1 * y1 + j2 * y2 + j3 * y3 + j4 * y4 + j5 * y5 + j6 * y6
    vector[c]! -= j1 * z1 + j2 * z2 + j3 * z3 + j4 * z4 + j5 * z5 + j6 * z6
  }
}

/** rest = (L·D·Lᵀ)⁻¹·rest, of the six numbers from `at` on. */
function backSix({ parts, rest }: SixFactors, at: 0 | 6): void {
  const l21 = parts[0]!
  const l31 = parts[1]!, l32 = parts[2]!
  const l41 = parts[3]!, l42 = parts[4]!, l43 = parts[5]!
  const l51 = parts[6]!, l52 = parts[7]!, l53 = parts[8]!, l54 = parts[9]!
  const l61 = parts[10]!, l62 = parts[11]!, l63 = parts[12]!, l64 = parts[13]!, l65 = parts[14]!
  const f1 = rest[at]!
  const f2 = rest[at + 1]! - l21 * f1
  const f3 = rest[at + 2]! - l31 * f1 - l32 * f2
  const f4 = rest[at + 3]! - l41 * f1 - l42 * f2 - l43 * f3
  const f5 = rest[at + 4]! - l51 * f1 - l52 * f2 - l53 * f3 - l54 * f4
  const f6 = rest[at + 5]! - l61 * f1 - l62 * f2 - l63 * f3 - l64 * f4 - l65 * f5
  const g6 = f6 * parts[20]!
  const g5 = f5 * parts[19]! - l65 * g6
  const g4 = f4 * parts[18]! - l54 * g5 - l64 * g6
  const g3 = f3 * parts[17]! - l43 * g4 - l53 * g5 - l63 * g6
  const g2 = f2 * parts[16]! - l32 * g3 - l42 * g4 - l52 * g5 - l62 * g6
  const g1 = f1 * parts[15]! - l21 * g2 - l31 * g3 - l41 * g4 - l51 * g5 - l61 * g6
  rest[at] = g1
  rest[at + 1] = g2
  rest[at + 2] = g3
  rest[at + 3] = g4
  rest[at + 4] = g5
  rest[at + 5] = g6
}
