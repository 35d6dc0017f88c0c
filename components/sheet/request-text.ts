import type { ChainJoint } from '@/lib/kinematics/chain'
import type { Units } from '@/lib/units'
import { numbersOfConfiguration } from './configuration-text'

interface Question {
  /** Scheme and host of this installation. */
  readonly site: string
  /** Path of the revision under /api/v1. */
  readonly path: string
  readonly fingerprint: string
  /** Left out for the default chain. */
  readonly chain?: { readonly base: string; readonly tip: string } | undefined
  readonly joints: readonly ChainJoint[]
  readonly q: readonly number[]
  readonly units: Units
}

/** Inside single quotes a shell reads everything but the single quote itself. */
const quoted = (text: string): string => `'${text.replaceAll("'", `'\\''`)}'`

/** The curl command that asks where the tool is in the configuration drawn, of exactly this fingerprint. */
export function forwardKinematicsCurl({ site, path, fingerprint, chain, joints, q, units }: Question): string {
  const body = { ...(chain === undefined ? {} : { chain }), units, configurations: [numbersOfConfiguration(joints, q, units)] }
  return [
    `curl ${quoted(`${site}/api/v1${path}/forward-kinematics`)}`,
    '  -H "Authorization: Bearer $ELBOWROOM_KEY"',
    "  -H 'Content-Type: application/json'",
    `  -H ${quoted(`If-Match: "${fingerprint}"`)}`,
    `  -d ${quoted(JSON.stringify(body))}`,
  ].join(' \\\n')
}
