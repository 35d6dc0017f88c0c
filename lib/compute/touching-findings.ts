import type { Description, Finding } from '@/lib/urdf/description'

const jointElement = (name: string) => `joint '${name}'`
const linkElement = (name: string) => `link '${name}'`

/** The findings about links and joints between base and tip, and about joints that follow or lead those by mimic. */
export function touchingFindings(description: Description, findings: readonly Finding[], base: string, tip: string): Finding[] {
  if (findings.length === 0) return []
  const jointAbove = new Map(description.joints.map((joint) => [joint.child, joint]))
  const wayUp = (link: string): Set<string> => {
    const elements = new Set([linkElement(link)])
    for (let joint = jointAbove.get(link); joint !== undefined; joint = jointAbove.get(joint.parent)) {
      elements.add(jointElement(joint.name)).add(linkElement(joint.parent))
    }
    return elements
  }
  const fromTip = wayUp(tip)
  const fromBase = wayUp(base)
  // What both ways share lies above the link where they meet, which is the first that they share.
  const meeting = [...fromTip].find((element) => fromBase.has(element))
  const touched = new Set([...fromTip, ...fromBase].filter((element) => element === meeting || !(fromTip.has(element) && fromBase.has(element))))
  for (const { name, mimic } of description.joints) {
    if (mimic === null) continue
    const pair = [jointElement(name), jointElement(mimic.joint)]
    if (pair.some((element) => touched.has(element))) for (const element of pair) touched.add(element)
  }
  return findings.filter(({ element }) => element !== undefined && touched.has(element))
}
