import type { Change, LimitChange } from '@/lib/contract/comparison'
import { poseDifference } from '@/lib/math/pose-difference'
import { quaternionOf } from '@/lib/math/quaternion'
import type { DescribedJoint, Description, Origin, Triple } from '@/lib/urdf/description'
import { transformOfOrigin } from '@/lib/urdf/joint-transform'
import type { Matches } from './match-elements'

/** What differs between two descriptions, element by element. */
export interface Listed {
  readonly changes: Change[]
  readonly limits: LimitChange[]
}

type Kind = Change['what']
type Say = (element: string, what: Kind, from: Change['from'], to: Change['to'], more?: Pick<Change, 'distance' | 'angle' | 'quantity'>) => void

/** Numbers of a joint that are compared as they are; null is unknown. */
const NUMBERS = ['rate', 'effort', 'acceleration', 'deceleration', 'jerk'] as const satisfies readonly Kind[]

const jointElement = (name: string) => `joint '${name}'`
const linkElement = (name: string) => `link '${name}'`
const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

/** Lists the changes from one description to another: the robot, then joints and links in the order of `to`, then what was removed.
 *  That a name changed with a renamed joint or link is said once, where it was renamed. A generator, to be run in slices. */
export function* listChanges(from: Description, to: Description, matches: Matches): Generator<void, Listed> {
  const listed: Listed = { changes: [], limits: [] }
  const say: Say = (element, what, before, after, more = {}) =>
    void listed.changes.push({ element, what, ...(before === undefined ? {} : { from: before }), ...(after === undefined ? {} : { to: after }), ...more })

  if (from.robotName !== to.robotName) say('robot', 'name', from.robotName, to.robotName)
  if (from.version !== to.version) say('robot', 'version', from.version, to.version)
  if ((matches.links.get(from.root) ?? from.root) !== to.root) say('robot', 'root', from.root, to.root)

  const earlierJoints = new Map(from.joints.map((joint) => [matches.joints.get(joint.name), joint]))
  for (const joint of to.joints) {
    const earlier = earlierJoints.get(joint.name)
    if (earlier === undefined) say(jointElement(joint.name), 'added', undefined, joint.type)
    else compareJoints(earlier, joint, matches, listed, say)
    yield
  }
  const earlierLinks = new Map(from.links.map((link) => [matches.links.get(link.name), link]))
  for (const link of to.links) {
    const earlier = earlierLinks.get(link.name)
    const element = linkElement(link.name)
    if (earlier === undefined) say(element, 'added', undefined, undefined)
    else {
      if (earlier.name !== link.name) say(element, 'renamed', earlier.name, link.name)
      if (!same(earlier.meshes, link.meshes)) say(element, 'meshes', [...earlier.meshes], [...link.meshes])
    }
    yield
  }
  for (const { name, type } of from.joints) if (!matches.joints.has(name)) say(jointElement(name), 'removed', type, undefined)
  for (const { name } of from.links) if (!matches.links.has(name)) say(linkElement(name), 'removed', undefined, undefined)
  return listed
}

function compareJoints(a: DescribedJoint, b: DescribedJoint, { joints, links }: Matches, { limits }: Listed, say: Say): void {
  const element = jointElement(b.name)
  if (a.name !== b.name) say(element, 'renamed', a.name, b.name)
  if (a.type !== b.type) say(element, 'type', a.type, b.type)
  for (const end of ['parent', 'child'] as const) if ((links.get(a[end]) ?? a[end]) !== b[end]) say(element, end, a[end], b[end])
  if (!same(a.origin, b.origin)) {
    const { distance, angle } = poseDifference(transformOfOrigin(a.origin), transformOfOrigin(b.origin))
    say(element, 'origin', presentOrigin(a.origin), presentOrigin(b.origin), { distance, angle })
  }
  if (!same(a.axis, b.axis)) say(element, 'axis', [...a.axis], [...b.axis], { angle: angleBetween(a.axis, b.axis) })
  for (const number of NUMBERS) if (a[number] !== b[number]) say(element, number, a[number], b[number], quantityOf(a, b))
  const followed = a.mimic && { ...a.mimic, joint: joints.get(a.mimic.joint) ?? a.mimic.joint }
  if (!same(followed, b.mimic)) say(element, 'mimic', a.mimic && { ...a.mimic }, b.mimic && { ...b.mimic })
  for (const limit of ['lower', 'upper'] as const) {
    if (a[limit] !== b[limit]) limits.push({ joint: b.name, limit, from: a[limit], to: b[limit], change: changeOf(limit, a[limit], b[limit]), ...quantityOf(a, b) })
  }
}

const QUANTITIES: Partial<Record<DescribedJoint['type'], 'angle' | 'length'>> = { revolute: 'angle', continuous: 'angle', prismatic: 'length' }

/** What a joint moves by in both revisions. */
function quantityOf(a: DescribedJoint, b: DescribedJoint): Pick<LimitChange, 'quantity'> {
  const [one, other] = [QUANTITIES[a.type], QUANTITIES[b.type]]
  // A joint that is fixed on one side has numbers on the other only.
  if (one !== undefined && other !== undefined && one !== other) return {}
  const quantity = one ?? other
  return quantity === undefined ? {} : { quantity }
}

/** No bound is wider than any. */
function changeOf(limit: 'lower' | 'upper', from: number | null, to: number | null): LimitChange['change'] {
  if (from === null || to === null) return to === null ? 'widened' : 'narrowed'
  return limit === 'lower' === to > from ? 'narrowed' : 'widened'
}

const presentOrigin = (origin: Origin) => ({ position: [...origin.xyz], quaternion: [...quaternionOf(transformOfOrigin(origin))] })

/** The angle between two axes (rad); a joint without an axis has [0, 0, 0], which stands at no angle to any. */
function angleBetween([a, b, c]: Triple, [x, y, z]: Triple): number {
  return Math.atan2(Math.hypot(b * z - c * y, c * x - a * z, a * y - b * x), a * x + b * y + c * z)
}
