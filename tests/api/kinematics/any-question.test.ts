import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ask, QUESTIONS, type Question } from './ask'

const extreme = fc.oneof(
  fc.constantFrom(0, 1, -1, 1e9, -1e9, 1e-9, 1e-17, 1e-160, 1e-308, 5e-324, -5e-324, Math.PI, Math.PI / 2),
  fc.double({ min: -4, max: 4, noNaN: true }),
  fc.double({ min: -1e9, max: 1e9, noNaN: true }),
)
const positive = fc.oneof(fc.constantFrom(5e-324, 1e-308, 1e-160, 1e-9, 0.01, 1), fc.double({ min: 1e-12, max: 1, noNaN: true }))
const list = (length: number) => fc.array(extreme, { minLength: length, maxLength: length })
const unitQuaternion = fc
  .tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: 0.1, max: 1, noNaN: true }))
  .map(([x, y, w]) => [x, y, 0, w].map((value) => value / Math.hypot(x, y, w)))
const pose = fc.record({ position: list(3), quaternion: unitQuaternion })
const gain = extreme.map(Math.abs)

const common = (joints: number) => ({
  configurations: fc.array(list(joints), { minLength: 1, maxLength: 3 }),
  units: fc.record({ length: fc.constantFrom('m', 'mm'), angle: fc.constantFrom('rad', 'deg') }),
  tool: pose,
  characteristicLength: fc.constantFrom(1e-9, 1e-3, 1, 1e9),
})
const task = fc.record({ components: fc.subarray(['vx', 'vy', 'vz', 'wx', 'wy', 'wz'], { minLength: 1 }), frame: fc.constantFrom('base', 'tip') })
const inverse = fc.oneof(
  fc.record({ method: fc.constant('truncated'), tolerance: positive }),
  fc.record({ method: fc.constant('damped'), damping: fc.oneof(fc.constant(0), positive) }),
  fc.record({ method: fc.constant('adaptive-damped'), threshold: positive, maxDamping: positive }),
  fc.record({ method: fc.constant('filtered'), threshold: positive, damping: fc.oneof(fc.constant(0), positive) }),
)
const optional = { requiredKeys: ['configurations'] as never[] }

const secondary = (joints: number) =>
  fc.array(
    fc.oneof(
      fc.record({ objective: fc.constantFrom('mid-range', 'manipulability'), gain }),
      fc.record({ objective: fc.constant('posture'), posture: list(joints), gain }),
    ),
    { maxLength: 2 },
  )

/** As light and as heavy as weights may be, and as far apart. */
const jointWeights = (joints: number) =>
  fc.oneof(
    fc.array(fc.constantFrom(1e-12, 1e-6, 1), { minLength: joints, maxLength: joints }),
    fc.array(fc.constantFrom(1, 3, 1e6, 1e12), { minLength: joints, maxLength: joints }),
  )

const limits = (joints: number) => {
  const rates = { rates: fc.constantFrom('scale', 'saturate', 'report'), derating: positive }
  const dt = fc.constantFrom(1e-6, 0.01, 1, 1000)
  const accelerations = fc.array(fc.oneof(fc.constant(null), fc.constant(1e9), positive), { minLength: joints, maxLength: joints })
  return fc.oneof(
    fc.record(rates, { requiredKeys: [] }),
    fc.record({ ...rates, dt, accelerations, previousRates: fc.array(list(joints), { minLength: 1, maxLength: 1 }) }, { requiredKeys: ['dt', 'accelerations'] }),
    fc.record({ ...rates, dt }),
  )
}

const QUESTION: Readonly<Record<Question, (joints: number) => fc.Arbitrary<object>>> = {
  'forward-kinematics': (joints) => fc.record({ ...common(joints), matrices: fc.boolean() }, optional),
  jacobian: (joints) => fc.record({ ...common(joints), task, frame: fc.constantFrom('base', 'tip') }, optional),
  'null-space': (joints) => {
    const alignTo = fc.integer({ min: 0, max: joints + 1 }).chain((width) => fc.array(list(width), { minLength: joints, maxLength: joints }))
    return fc.record({ ...common(joints), task, tolerance: positive, alignTo }, optional)
  },
  'joint-rates': (joints) => {
    const wish = fc.oneof(
      fc.record({ twists: fc.array(list(6), { minLength: 1, maxLength: 1 }) }),
      fc.record({ references: fc.array(fc.record({ pose, twist: list(6), gains: fc.record({ position: gain, orientation: gain }) }), { minLength: 1, maxLength: 1 }) }),
    )
    const rest = { task, inverse, jointWeights: jointWeights(joints), secondary: secondary(joints), limits: limits(joints) }
    return fc.tuple(fc.record({ ...common(joints), ...rest }, optional), wish).map(([question, more]) => ({ ...question, ...more }))
  },
  'inverse-kinematics': (joints) => {
    const { configurations: _none, ...rest } = common(joints)
    const tolerance = fc.constantFrom(1e-12, 1e-6, 1, 1e6)
    return fc.record(
      {
        ...rest, task, positionTolerance: tolerance, orientationTolerance: tolerance, secondary: secondary(joints),
        targets: fc.array(pose, { minLength: 1, maxLength: 2 }), seeds: fc.array(list(joints), { minLength: 1, maxLength: 1 }), attempts: fc.integer({ min: 1, max: 2 }),
      },
      { requiredKeys: ['targets', 'attempts'] },
    )
  },
}

const MODELS = [['trainer-3r', 3], ['gannet-4', 4], ['skerry-7', 7]] as const

describe.each(QUESTIONS)('%s', (question) => {
  it.each(MODELS)('answers any well-formed question about %s with numbers or with what is wrong, never with a fault of its own', async (model, joints) => {
    await fc.assert(
      fc.asyncProperty(QUESTION[question](joints), async (json) => {
        const { status, text } = await ask(question, model, json)
        expect([200, 422], `${JSON.stringify(json)}\n${text.slice(0, 300)}`).toContain(status)
        // A 422 here is a number beyond 1e9 in SI and nothing else.
        if (status === 422) expect(text).toContain('is beyond 1e9')
      }),
      { seed: 20261201, numRuns: 60 },
    )
  })
})
