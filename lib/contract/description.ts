import { z } from 'zod'
import { MeshReference } from './mesh'
import { Digest, Triple } from './scalars'

export const Severity = z.enum(['error', 'warning', 'note'])

/** One thing the importer has to say about a file. */
export const Finding = z
  .strictObject({
    rule: z.string().meta({ description: 'Its page is /docs/findings/<rule>.', example: 'axis-normalised' }),
    severity: Severity,
    message: z.string(),
    remedy: z.string(),
    line: z.int().min(1),
    column: z.int().min(1).meta({ description: 'In characters, from 1.' }),
    element: z.string().optional().meta({ example: "joint 'wrist'" }),
  })
  .meta({ id: 'Finding' })
export type Finding = z.infer<typeof Finding>

const Origin = z
  .strictObject({
    position: Triple.meta({ description: 'm' }),
    quaternion: z.array(z.number()).length(4).meta({ description: '[x, y, z, w]' }),
  })
  .meta({ description: 'Joint frame in the parent link.' })

const Bound = z.number().nullable()

/** A joint as the sheet shows it. Limits are left out on joints that have none to have. */
export const Joint = z
  .strictObject({
    name: z.string(),
    type: z.enum(['revolute', 'continuous', 'prismatic', 'fixed', 'floating', 'planar']),
    parent: z.string(),
    child: z.string(),
    origin: Origin,
    axis: Triple.optional().meta({ description: 'Unit vector in the joint frame.' }),
    lower: Bound.optional().meta({ description: 'rad or m; null: no bound.' }),
    upper: Bound.optional().meta({ description: 'rad or m; null: no bound.' }),
    rate: Bound.optional().meta({ description: 'rad/s or m/s; null: unknown, never used to stop or clamp.' }),
    effort: Bound.optional().meta({ description: 'N m or N; null: unknown.' }),
    mimic: z.strictObject({ joint: z.string(), multiplier: z.number(), offset: z.number() }).optional(),
  })
  .meta({ id: 'Joint' })
export type Joint = z.infer<typeof Joint>

export const Chain = z
  .strictObject({
    base: z.string(),
    tip: z.string(),
    joints: z.array(z.string()).meta({ description: 'Independent joints, base to tip: the order of a configuration.' }),
    default: z.boolean(),
  })
  .meta({ id: 'Chain' })
export type Chain = z.infer<typeof Chain>

/** What the importer read out of a file. */
export const structureFields = {
  robotName: z.string().meta({ description: 'The name inside the file; may be empty.' }),
  fingerprint: Digest.meta({ description: 'SHA-256 over the canonical kinematic content.' }),
  sourceDigest: Digest.meta({ description: 'SHA-256 over the file as uploaded.' }),
  counts: z.strictObject({
    links: z.int(),
    joints: z.int(),
    independent: z.int().meta({ description: 'Joints that move on their own: not fixed, no mimic.' }),
  }),
  rootLink: z.string(),
  links: z.array(z.strictObject({ name: z.string() })),
  joints: z.array(Joint),
  chains: z.array(Chain),
}

export const Structure = z.strictObject(structureFields).meta({ id: 'Structure' })
export type Structure = z.infer<typeof Structure>

/** What the check of an import answers. structure: left out when a finding is an error. */
export const CheckedImport = z.strictObject({
  findings: z.array(Finding),
  structure: Structure.optional(),
  meshes: z.array(MeshReference).optional().meta({ description: 'Where each mesh that the description refers to is found; left out when there are none.' }),
  archive: z
    .strictObject({
      entry: z.string().optional().meta({ description: 'Path of the description that was read.' }),
      descriptions: z.array(z.string()).meta({ description: 'Paths of all descriptions in it. Of several one is chosen by the form field "entry".' }),
    })
    .optional()
    .meta({ description: 'Of an archive only.' }),
})
