/** Ways to break, or merely to bend, a robot drawn by random-tree.ts. Each takes the text and a generator of numbers in [0, 1), and gives
 *  the text back where it does not apply. */
export type Breakage = (urdf: string, random: () => number) => string

const JOINT = /<joint [\s\S]*?<\/joint>/g
const LIMITED = /<joint [^>]*type="(?:revolute|prismatic)"[\s\S]*?<\/joint>/g
const MOVING = /<joint [^>]*type="(?:revolute|prismatic|continuous)"[\s\S]*?<\/joint>/g

/** Changes one of the places that match. */
function change(urdf: string, random: () => number, pattern: RegExp, by: (met: string) => string): string {
  const met = [...urdf.matchAll(pattern)]
  const place = met[Math.floor(met.length * random())]
  return place === undefined ? urdf : urdf.slice(0, place.index) + by(place[0]) + urdf.slice(place.index + place[0].length)
}

const joint = (by: (met: string) => string, pattern = JOINT): Breakage => (urdf, random) => change(urdf, random, pattern, by)
/** Puts something into a joint in front of its end. */
const inJoint = (body: string, pattern = JOINT): Breakage => joint((met) => met.replace('</joint>', `${body}</joint>`), pattern)
const limit = (by: string): Breakage => joint((met) => met.replace(/<limit [^>]*>/, by), LIMITED)
const axis = (by: string): Breakage => joint((met) => met.replace(/<axis [^>]*>/, by), MOVING)
const origin = (by: string): Breakage => joint((met) => met.replace(/<origin [^>]*>/, '').replace('</joint>', `<origin ${by}/></joint>`))
const mimic = (by: string): Breakage => joint((met) => met.replace(/<mimic [^>]*>/, '').replace('</joint>', `${by}</joint>`), MOVING)
const robot = (attributes: string): Breakage => (urdf) => urdf.replace(/<robot name="[^"]*"/, `<robot ${attributes}`)
const atEnd = (body: string): Breakage => (urdf) => urdf.replace('</robot>', `${body}</robot>`)
const atStart = (body: string): Breakage => (urdf) => body + urdf
const firstLink = (by: string): Breakage => (urdf) => urdf.replace('<link name="l0"/>', by)

export const BREAKAGES: Readonly<Record<string, Breakage>> = {
  'nothing at all': (urdf) => urdf,
  'a second link of a name': atEnd('<link name="l0"/>'),
  'a second joint of a name': joint((met) => met + met),
  'a link without a name': atEnd('<link/>'),
  'a link with an empty name': atEnd('<link name=""/>'),
  'a joint without a name': joint((met) => met.replace(/ name="[^"]*"/, '')),
  'a joint without a type': joint((met) => met.replace(/ type="[^"]*"/, '')),
  'a joint of an unknown type': joint((met) => met.replace(/ type="[^"]*"/, ' type="hinge"')),
  'a floating joint': joint((met) => met.replace(/ type="[^"]*"/, ' type="floating"')),
  'a joint without a parent': joint((met) => met.replace(/<parent [^>]*>/, '')),
  'a joint without a child': joint((met) => met.replace(/<child [^>]*>/, '')),
  'a parent without a link': joint((met) => met.replace(/<parent [^>]*>/, '<parent/>')),
  'a second parent': inJoint('<parent link="l0"/>'),
  'a second axis': inJoint('<axis xyz="1 0 0"/>', MOVING),
  'a child that is not declared': joint((met) => met.replace(/<child [^>]*>/, '<child link="nowhere"/>')),
  'a joint that is left out': joint(() => ''),
  'a link that hangs on two joints': atEnd('<joint name="again" type="fixed"><parent link="l0"/><child link="l1"/></joint>'),
  'a loop through the root': atEnd('<joint name="back" type="fixed"><parent link="l1"/><child link="l0"/></joint>'),
  'a loop beside the tree': atEnd(
    '<link name="e"/><link name="f"/><joint name="e" type="fixed"><parent link="e"/><child link="f"/></joint><joint name="f" type="fixed"><parent link="f"/><child link="e"/></joint>',
  ),
  'a joint from a link to itself': joint((met) => met.replace(/<parent link="([^"]*)"\/><child [^>]*>/, '<parent link="$1"/><child link="$1"/>')),
  'an axis of zeros': axis('<axis xyz="0 0 0"/>'),
  'an axis without xyz': axis('<axis/>'),
  'an axis of length 2': axis('<axis xyz="0 0 2"/>'),
  'no axis': axis(''),
  'an axis of two numbers': axis('<axis xyz="0 1"/>'),
  'an axis of four numbers': axis('<axis xyz="0 1 0 0"/>'),
  'an axis of words': axis('<axis xyz="a b c"/>'),
  'a place that is not a number': origin('xyz="0 0 nan"'),
  'a place at infinity': origin('xyz="0 0 inf"'),
  'a place in hexadecimal': origin('xyz="0 0 0x1"'),
  'a place with a decimal comma': origin('xyz="0 0 0,5"'),
  'a place beyond binary64': origin('xyz="0 0 1e400"'),
  'a place beyond 1e9': origin('xyz="0 0 1e12"'),
  'an empty place': origin('xyz=""'),
  'a quaternion in version 1.0': origin('quat_xyzw="0 0 0 1"'),
  'no limit': limit(''),
  'a limit without a rate': limit('<limit lower="-1" upper="1" effort="1"/>'),
  'a limit without an effort': limit('<limit lower="-1" upper="1" velocity="1"/>'),
  'a limit without bounds': limit('<limit effort="1" velocity="1"/>'),
  'a rate of zero': limit('<limit lower="-1" upper="1" effort="1" velocity="0"/>'),
  'bounds exchanged': limit('<limit lower="1" upper="-1" effort="1" velocity="1"/>'),
  'equal bounds': limit('<limit lower="1" upper="1" effort="1" velocity="1"/>'),
  'a bound of words': limit('<limit lower="low" upper="1" effort="1" velocity="1"/>'),
  'bounds of a continuous joint': joint((met) => met.replace(/ type="[^"]*"/, ' type="continuous"'), LIMITED),
  'a leader that is nowhere': mimic('<mimic joint="nowhere"/>'),
  'a mimic without a leader': mimic('<mimic/>'),
  'a joint that follows itself': joint((met) => met.replace(/<mimic [^>]*>/, '').replace('</joint>', `<mimic joint="${/name="([^"]*)"/.exec(met)![1]}"/></joint>`), MOVING),
  'two joints that follow each other': atEnd(
    '<link name="e"/><link name="f"/><joint name="e" type="continuous"><parent link="l0"/><child link="e"/><mimic joint="f"/></joint>' +
      '<joint name="f" type="continuous"><parent link="l0"/><child link="f"/><mimic joint="e"/></joint>',
  ),
  'a multiplier of words': mimic('<mimic joint="trunk0" multiplier="twice"/>'),
  'a value for xacro': origin('xyz="${x} 0 0"'),
  'a macro that is left': atEnd('<xacro:property name="x" value="1"/>'),
  'a robot without a name': robot(''),
  'a robot with an empty name': robot('name=""'),
  'version 1.0': robot('name="r" version="1.0"'),
  'a version of the future': robot('name="r" version="3.0"'),
  'another root element': (urdf) => urdf.replace('<robot ', '<model ').replace('</robot>', '</model>'),
  'no links': () => '<robot name="r"></robot>',
  'one link without a name': () => '<robot name="r"><link name=""/></robot>',
  'a tag that is not closed': (urdf) => urdf.replace('</robot>', ''),
  'an attribute given twice': robot('name="r" name="s"'),
  'a document type': atStart('<!DOCTYPE robot>'),
  'a byte that is not UTF-8': atStart('<!-- \u00ff -->'),
  'an ampersand': robot('name="a & b"'),
  'text behind the robot': (urdf) => `${urdf}text`,
  'a second robot': (urdf) => `${urdf}<robot name="s"/>`,
  'two hyphens in a comment': atEnd('<!-- a -- b -->'),
  'a control character': robot('name="a\u0001b"'),
  'elements 100 deep': atEnd(`<gazebo>${'<a>'.repeat(100)}${'</a>'.repeat(100)}</gazebo>`),
  'a name of 300 characters': robot(`name="${'x'.repeat(300)}"`),
  'an element of a simulator': atEnd('<gazebo reference="l0"><joint name="trunk0"/></gazebo>'),
  'a loop joint': atEnd('<loop_joint name="loop"/>'),
  'a prefix without a namespace': atEnd('<gz:box/>'),
  'a mesh that is not there': firstLink('<link name="l0"><visual><geometry><mesh filename="package://r/a.stl"/></geometry></visual></link>'),
  'a mesh without a file': firstLink('<link name="l0"><visual><geometry><mesh/></geometry></visual></link>'),
  'a shape that is not known': firstLink('<link name="l0"><visual><geometry><cone/></geometry></visual></link>'),
  'a visual without a geometry': firstLink('<link name="l0"><visual/></link>'),
  'an inertial without a mass': firstLink('<link name="l0"><inertial><inertia ixx="1" ixy="0" ixz="0" iyy="1" iyz="0" izz="1"/></inertial></link>'),
  'a negative mass': firstLink('<link name="l0"><inertial><mass value="-1"/><inertia ixx="1" ixy="0" ixz="0" iyy="1" iyz="0" izz="1"/></inertial></link>'),
  'a material that is not defined': firstLink('<link name="l0"><visual><geometry><sphere radius="1"/></geometry><material name="ghost"/></visual></link>'),
  'dynamics without values': inJoint('<dynamics/>'),
  'an attribute that is not known': joint((met) => met.replace('<parent ', '<parent lnk="a" ')),
  'names with blanks and slashes': (urdf) => urdf.replaceAll('"l0"', '"left arm/base"'),
}
