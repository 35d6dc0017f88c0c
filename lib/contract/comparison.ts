import { z } from 'zod'
import { Digest, Status, Triple } from './scalars'

/** More changes than this are counted and not listed. */
export const MOST_CHANGES = 1000

/** How many configurations an effect is taken over. */
export const EFFECT_SAMPLES = 2000
export const EFFECT_SEED = 1

const RevisionName = z
  .string()
  .regex(/^(?:released|[1-9][0-9]{0,9})$/, 'is neither the number of a revision nor "released"')
  .meta({ description: 'Number of a revision, or "released".', example: '1' })

/** What is compared, and between which links. */
export const ComparisonQuery = z.strictObject({
  from: RevisionName.optional().meta({ description: 'The earlier revision; left out: the one before "to".' }),
  to: RevisionName.optional().meta({ description: 'The later revision; left out: the newest.' }),
  base: z.string().max(1000).optional().meta({ description: 'A link of "to"; its root when left out.' }),
  tip: z.string().max(1000).optional().meta({ description: 'A link of "to"; that of its default chain when left out.' }),
})

export type ComparisonQuery = z.infer<typeof ComparisonQuery>

const Side = z.strictObject({ revision: z.int(), status: Status, fingerprint: Digest })

const Displacement = z.strictObject({
  max: z.number(),
  mean: z.number(),
  p95: z.number().meta({ description: '95th percentile: the smallest value that 95 % of the configurations do not exceed.' }),
  worst: z.array(z.number()).optional().meta({ description: 'The configuration of max, in the order of chain.joints, SI; left out where max is 0.' }),
})

/** A joint that does not take part in the configurations, and where it stands instead. */
const HeldJoint = z.strictObject({
  joint: z.string(),
  in: z.enum(['from', 'to', 'both']).meta({ description: 'The revision whose chain has it; both: the two ranges do not meet.' }),
  quantity: z.enum(['angle', 'length']).meta({ description: 'What it moves by.' }),
  value: z.number().meta({ description: 'rad or m: 0, or the middle between two ranges that do not meet.' }),
})
export type HeldJoint = z.infer<typeof HeldJoint>

const ComparedChain = z.strictObject({
  base: z.string(),
  tip: z.string(),
  joints: z.array(z.string()).meta({ description: 'The independent joints that both revisions move the tip by, in the order and under the names of "to".' }),
  types: z.array(z.enum(['revolute', 'continuous', 'prismatic'])),
  former: z
    .strictObject({ base: z.string(), tip: z.string(), joints: z.array(z.string()) })
    .meta({ description: 'The same links and joints under the names of "from".' }),
  held: z.array(HeldJoint).meta({ description: 'Joints that stand still: only one revision has them, or their ranges do not meet.' }),
})

const Quantity = z.enum(['angle', 'length']).meta({ description: 'What the joint moves by: rad or m; left out where the revisions differ in it.' })

const CHANGE_KINDS = [
  'added', 'removed', 'renamed', 'type', 'parent', 'child', 'origin', 'axis', 'rate', 'effort', 'acceleration', 'deceleration', 'jerk', 'mimic',
  'name', 'version', 'root', 'meshes',
] as const

const Value = z.union([
  z.string(),
  z.number(),
  z.null(),
  z.array(z.number()),
  z.array(z.string()),
  z.strictObject({ position: Triple, quaternion: z.array(z.number()).length(4) }),
  z.strictObject({ joint: z.string(), multiplier: z.number(), offset: z.number() }),
])

const Change = z.strictObject({
  element: z.string().meta({ description: 'As it is called in "to"; what was removed, as in "from".', example: "joint 'elbow'" }),
  what: z.enum(CHANGE_KINDS),
  from: Value.optional(),
  to: Value.optional(),
  distance: z.number().optional().meta({ description: 'm, how far an origin moved.' }),
  angle: z.number().optional().meta({ description: 'rad, how far an origin or an axis turned.' }),
  quantity: Quantity.optional(),
})
export type Change = z.infer<typeof Change>

const LimitChange = z.strictObject({
  joint: z.string(),
  limit: z.enum(['lower', 'upper']),
  from: z.number().nullable().meta({ description: 'rad or m; null: no bound.' }),
  to: z.number().nullable(),
  change: z.enum(['narrowed', 'widened']),
  quantity: Quantity.optional(),
})
export type LimitChange = z.infer<typeof LimitChange>

/** Two revisions of a model side by side, SI. */
export const Comparison = z
  .strictObject({
    from: Side,
    to: Side,
    sameKinematics: z.boolean().meta({ description: 'The fingerprints agree: nothing that enters the computation differs, and nothing was computed.' }),
    chain: ComparedChain,
    effect: z.strictObject({
      samples: z.int().meta({ description: 'Configurations compared; 0 where the fingerprints agree.' }),
      seed: z.int(),
      translation: Displacement.meta({ description: 'm, of the tip, in the base link.' }),
      rotation: Displacement.meta({ description: 'rad, of the tip.' }),
    }),
    limits: z.array(LimitChange),
    changes: z.array(Change),
    leftOut: z.int().optional().meta({ description: `Changes and limits beyond the first ${MOST_CHANGES} of each.` }),
  })
  .meta({ id: 'Comparison' })
export type Comparison = z.infer<typeof Comparison>
