import { numbers } from '../lib/kinematics/arms'

/** The generator's first numbers hang together with a small seed. */
const WARMING_UP = 10

/** Crooked directions that are exact in twelve decimals, because the importer keeps axes rounded to that: the third columns of the
 *  rotations of whole quaternions whose squares add up to 625. */
const CROOKED: readonly (readonly [number, number, number])[] = crookedAxes()

function crookedAxes(): [number, number, number][] {
  const axes: [number, number, number][] = []
  for (let a = 1; a <= 24; a++) {
    for (let b = 1; a * a + b * b < 625; b++) {
      for (let c = 1; a * a + b * b + c * c < 625; c++) {
        const d = Math.sqrt(625 - a * a - b * b - c * c)
        if (Number.isInteger(d)) axes.push([(2 * (b * d + a * c)) / 625, (2 * (c * d - a * b)) / 625, (a * a - b * b - c * c + d * d) / 625])
      }
    }
  }
  return axes
}

/** A robot as URDF text, drawn from a seed, with one of its leaves as tip: a trunk of 2 to 12 joints with branches, of mixed types, odd
 *  placements and axes that are neither short nor straight; some joints follow others, forwards and backwards, in chains, on the trunk
 *  and on branches. */
export function randomTree(seed: number): { readonly urdf: string; readonly base: string; readonly tip: string; readonly mimics: boolean } {
  const random = numbers(seed)
  for (let i = 0; i < WARMING_UP; i++) random()
  const spread = (half: number) => half * (2 * random() - 1)
  const pick = <T>(list: readonly T[]): T => list[Math.floor(list.length * random())]!
  const mimics = random() < 0.5
  const trunk = 2 + Math.floor(11 * random())
  const movable: string[] = []
  const links = ['l0']
  const joints: string[] = []

  const addJoint = (parent: string, name: string): string => {
    const link = `l${links.length}`
    links.push(link)
    const type = movable.length < 6 ? pick(['revolute', 'continuous', 'prismatic', 'revolute']) : pick(['revolute', 'continuous', 'prismatic', 'fixed'])
    const long = 0.2 + 3 * random()
    const axis = random() < 0.3 ? pick(['1 0 0', '0 -1 0', '0 0 1']) : pick(CROOKED).map((part) => long * part).join(' ')
    const origin = random() < 0.15 ? '' : `<origin xyz="${spread(0.6)} ${spread(0.6)} ${spread(0.6)}" rpy="${spread(3.1)} ${spread(3.1)} ${spread(3.1)}"/>`
    const follows = mimics && type !== 'fixed' && movable.length > 1 && random() < 0.25
    const mimic = follows ? `<mimic joint="${pick(movable)}" multiplier="${spread(2)}" offset="${spread(0.4)}"/>` : ''
    const limit = type === 'revolute' || type === 'prismatic' ? '<limit lower="-2" upper="2" effort="1" velocity="1"/>' : ''
    joints.push(`<joint name="${name}" type="${type}"><parent link="${parent}"/><child link="${link}"/>${origin}${type === 'fixed' ? '' : `<axis xyz="${axis}"/>`}${limit}${mimic}</joint>`)
    if (type !== 'fixed') movable.push(name)
    return link
  }
  let tip = 'l0'
  for (let i = 0; i < trunk; i++) {
    if (random() < 0.3) addJoint(tip, `branch${i}`)
    tip = addJoint(tip, `trunk${i}`)
  }
  return { urdf: `<robot name="tree_${seed}">${links.map((link) => `<link name="${link}"/>`).join('')}${joints.join('')}</robot>`, base: 'l0', tip, mimics }
}
