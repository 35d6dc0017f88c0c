import type { Rule } from '@/lib/urdf/rule'

const ARM = '  <link name="base"/>\n  <link name="arm"/>\n'
const robot = (body: string): string => `<robot name="r">\n${body}\n</robot>`
const joint = (name: string, body: string, type = 'revolute'): string =>
  `  <joint name="${name}" type="${type}">\n    <parent link="base"/>\n    <child link="arm"/>\n${body}\n  </joint>`
const LIMIT = '    <limit lower="-1" upper="1" effort="5" velocity="2"/>'
const AXIS = '    <axis xyz="0 0 1"/>'
const turning = (body: string): string => robot(ARM + joint('turn', body))
const twoLinks = (links: string, child: string): string =>
  robot(`${links}\n  <joint name="mount" type="fixed">\n    <parent link="base"/>\n    <child link="${child}"/>\n  </joint>`)
const mount = (name: string, parent: string, child: string): string =>
  `  <joint name="${name}" type="fixed"><parent link="${parent}"/><child link="${child}"/></joint>`
const finger = (name: string, child: string, mimic: string): string =>
  `  <joint name="${name}" type="continuous">\n    <parent link="base"/>\n    <child link="${child}"/>\n${AXIS}\n    <limit effort="5" velocity="2"/>${mimic}\n  </joint>`
const fingers = (first: string, second: string): string =>
  robot(`  <link name="base"/>\n  <link name="left"/>\n  <link name="right"/>\n${finger('grip', 'left', first)}\n${finger('follow', 'right', second)}`)
const mimic = (joint: string): string => `\n    <mimic joint="${joint}"/>`

/** Faults of the model: the file is read to its end, and each is reported. */
export const MODEL_RULES = {
  'not-urdf': {
    severity: 'error',
    title: 'The XML is not a robot description',
    meaning: 'The outermost element is not <robot>. Other formats for robots and scenes, such as SDF, COLLADA or SRDF parts, are XML too but are not URDF.',
    effect: 'Nothing is imported.',
    remedy: 'Ask the supplier for the URDF, or convert the file with a tool that you trust and check the result.',
    before: '<sdf version="1.9">\n  <model name="arm"/>\n</sdf>',
    after: '<robot name="arm">\n  <link name="base"/>\n</robot>',
  },
  'no-links': {
    severity: 'error',
    title: 'The robot has no link',
    meaning: 'No <link> stands directly inside <robot>. Links nested in other elements do not count.',
    effect: 'There is nothing to compute with.',
    remedy: 'Check that the file is the complete description. A file meant to be included in another has to be expanded first.',
    before: '<robot name="arm"/>',
    after: '<robot name="arm">\n  <link name="base"/>\n</robot>',
  },
  'duplicate-link': {
    severity: 'error',
    title: 'Two links have the same name',
    meaning: 'A second <link> uses a name that is already taken. Links and joints may share a name, two links may not.',
    effect: 'It is not clear which link a joint means.',
    remedy: 'Rename one of them, or delete the copy.',
    before: robot('  <link name="base"/>\n  <link name="base"/>'),
    after: robot('  <link name="base"/>'),
  },
  'duplicate-joint': {
    severity: 'error',
    title: 'Two joints have the same name',
    meaning: 'A second <joint> uses a name that is already taken.',
    effect: 'It is not clear which joint a value, a limit or a mimic belongs to.',
    remedy: 'Rename one of them, or delete the copy.',
    before: robot(`  <link name="base"/>\n  <link name="left"/>\n  <link name="right"/>\n${mount('mount', 'base', 'left')}\n${mount('mount', 'base', 'right')}`),
    after: robot(`  <link name="base"/>\n  <link name="left"/>\n  <link name="right"/>\n${mount('mount_left', 'base', 'left')}\n${mount('mount_right', 'base', 'right')}`),
  },
  'name-missing': {
    severity: 'error',
    title: 'A link or joint has no name',
    meaning: 'The attribute name is missing, empty or blank.',
    effect: 'Nothing can refer to the element, and a joint without a name cannot be given a value.',
    remedy: 'Give it a name that no other link (or joint) has.',
    before: robot('  <link/>'),
    after: robot('  <link name="base"/>'),
  },
  'joint-incomplete': {
    severity: 'error',
    title: 'A joint is incomplete or says something twice',
    meaning: 'A joint needs a type, exactly one <parent link="…"/> and exactly one <child link="…"/>, and at most one each of origin, axis, limit and mimic.',
    effect: 'The joint cannot be placed in the tree, or two statements contradict each other and nobody knows which one is in force.',
    remedy: 'Add what is missing, or delete the statement that does not hold.',
    before: robot(`  <link name="base"/>\n  <joint name="turn" type="fixed">\n    <parent link="base"/>\n  </joint>`),
    after: robot(ARM + joint('turn', '    <origin xyz="0 0 0.2"/>', 'fixed')),
  },
  'joint-type-unknown': {
    severity: 'error',
    title: 'The type of a joint is unknown',
    meaning: 'The type is none of revolute, continuous, prismatic, fixed, floating and planar. Capital letters and blanks count.',
    effect: 'Whether and how the joint moves is unknown.',
    remedy: 'Use one of the six types: revolute turns between stops, continuous turns without end, prismatic slides, fixed does not move.',
    before: robot(ARM + joint('turn', `${AXIS}\n${LIMIT}`, 'Revolute')),
    after: turning(`${AXIS}\n${LIMIT}`),
  },
  'link-undeclared': {
    severity: 'error',
    title: 'A joint names a link that does not exist',
    meaning: 'The parent or child of a joint is a link for which the file has no <link> directly inside <robot>. Capital letters, blanks and underscores count.',
    effect: 'The joint leads nowhere, and all that hangs on it is cut off.',
    remedy: 'Correct the spelling in the joint or in the link, or add the missing <link name="…"/>.',
    before: twoLinks('  <link name="base"/>\n  <link name="face_plate"/>', 'faceplate'),
    after: twoLinks('  <link name="base"/>\n  <link name="face_plate"/>', 'face_plate'),
  },
  'several-roots': {
    severity: 'error',
    title: 'The robot falls into several pieces',
    meaning: 'More than one link is the child of no joint, so the file describes several separate trees.',
    effect: 'Where the pieces stand relative to each other is unknown.',
    remedy: 'Join the pieces with fixed joints, or delete the links that are not used.',
    before: robot('  <link name="base"/>\n  <link name="camera"/>'),
    after: robot(`  <link name="base"/>\n  <link name="camera"/>\n${mount('camera_mount', 'base', 'camera')}`),
  },
  'two-parents': {
    severity: 'error',
    title: 'A link hangs on two joints',
    meaning: 'The same link is the child of more than one joint. URDF describes trees, in which each link has one parent.',
    effect: 'The pose of the link would follow from two joints that need not agree.',
    remedy: 'Keep the joint that carries the link. A mechanism that is closed in reality is cut open at one joint in URDF.',
    before: robot(`  <link name="base"/>\n  <link name="left"/>\n  <link name="tool"/>\n${mount('a', 'base', 'left')}\n${mount('b', 'base', 'tool')}\n${mount('c', 'left', 'tool')}`),
    after: robot(`  <link name="base"/>\n  <link name="left"/>\n  <link name="tool"/>\n${mount('a', 'base', 'left')}\n${mount('b', 'base', 'tool')}`),
  },
  cycle: {
    severity: 'error',
    title: 'Links form a loop',
    meaning: 'Following the joints from parent to child leads back to a link that was passed before.',
    effect: 'There is no base to start from, so no pose can be computed.',
    remedy: 'Turn the joint round or delete it: most often parent and child were exchanged. A mechanism that is closed in reality is cut open at one joint in URDF.',
    before: robot(`${ARM}${mount('out', 'base', 'arm')}\n${mount('back', 'arm', 'base')}`),
    after: robot(`${ARM}${mount('out', 'base', 'arm')}`),
  },
  'axis-zero': {
    severity: 'error',
    title: 'The axis of a joint has no direction',
    meaning: 'The axis of a joint that moves is shorter than 1e-9, or there is an <axis/> without xyz.',
    effect: 'The joint could turn about, or slide along, anything.',
    remedy: 'Give the direction of the axis in the joint frame, such as xyz="0 0 1". Delete the whole element if the default, x, is meant.',
    before: turning(`    <axis xyz="0 0 0"/>\n${LIMIT}`),
    after: turning(`${AXIS}\n${LIMIT}`),
  },
  'number-malformed': {
    severity: 'error',
    title: 'A number cannot be read',
    meaning: 'A value is not a decimal number with a point (such as -0.35 or 1e-3), there are too few or too many of them, the number is too large to compute with, or a quaternion does not have length 1.',
    effect: 'The value enters the computation, so it is not guessed at. NaN, infinity, hexadecimal numbers and decimal commas are refused.',
    remedy: 'Write the numbers in SI units with a decimal point, separated by blanks: three for xyz, rpy and an axis, four for quat_xyzw, one elsewhere.',
    before: turning(`    <origin xyz="0 0 0,35"/>\n${AXIS}\n${LIMIT}`),
    after: turning(`    <origin xyz="0 0 0.35"/>\n${AXIS}\n${LIMIT}`),
  },
  'limit-missing': {
    severity: 'error',
    title: 'A joint that needs limits has none',
    meaning: 'A revolute or prismatic joint has no <limit>. URDF 1.0 and 1.1 demand it.',
    effect: 'The range would be unknown, and programs disagree about what then holds: locked, or free.',
    remedy: 'Add a <limit> with lower, upper, effort and velocity. Use type="continuous" for a joint that turns without end.',
    before: turning(AXIS),
    after: turning(`${AXIS}\n${LIMIT}`),
  },
  'limit-inverted': {
    severity: 'error',
    title: 'A lower limit is above the upper one',
    meaning: 'After defaults, lower is greater than upper. A bound that is left out counts as 0 in URDF 1.0 and 1.1.',
    effect: 'No position of the joint would be allowed.',
    remedy: 'Exchange the two, or correct the sign of one.',
    before: turning(`${AXIS}\n    <limit lower="1" upper="-1" effort="5" velocity="2"/>`),
    after: turning(`${AXIS}\n${LIMIT}`),
  },
  'mimic-missing': {
    severity: 'error',
    title: 'A joint mimics a joint that does not exist',
    meaning: 'A <mimic> names no joint, or one that the file does not have.',
    effect: 'The joint would have no value.',
    remedy: 'Correct the name of the joint that is followed, or delete the <mimic> if the joint is driven by itself.',
    before: fingers('', mimic('gripp')),
    after: fingers('', mimic('grip')),
  },
  'mimic-self': {
    severity: 'error',
    title: 'A joint mimics itself',
    meaning: 'The <mimic> of a joint names the same joint.',
    effect: 'The joint would have no value of its own and none to follow.',
    remedy: 'Name the joint that drives it, or delete the <mimic>.',
    before: fingers('', mimic('follow')),
    after: fingers('', mimic('grip')),
  },
  'mimic-cycle': {
    severity: 'error',
    title: 'Joints mimic each other in a circle',
    meaning: 'Following the <mimic> elements from joint to joint leads back to the start.',
    effect: 'None of the joints would be driven.',
    remedy: 'Delete the <mimic> of the joint that has the drive.',
    before: fingers(mimic('follow'), mimic('grip')),
    after: fingers('', mimic('grip')),
  },
  'orientation-twice': {
    severity: 'error',
    title: 'An origin gives two orientations',
    meaning: 'The origin of a joint has both rpy and quat_xyzw.',
    effect: 'Programs differ in which of the two they use.',
    remedy: 'Keep one of them.',
    before: turning(`    <origin xyz="0 0 0.2" rpy="0 0 0" quat_xyzw="0 0 0 1"/>\n${AXIS}\n${LIMIT}`).replace('name="r"', 'name="r" version="1.1"'),
    after: turning(`    <origin xyz="0 0 0.2" rpy="0 0 0"/>\n${AXIS}\n${LIMIT}`),
  },
  'xacro-unexpanded': {
    severity: 'error',
    title: 'Macros have not been expanded',
    meaning: 'The file still holds xacro elements or ${…} and $(…) where a name or a number is needed. It is the source from which the URDF is made, not the URDF.',
    effect: 'The values are not in the file.',
    remedy: 'Run the file through xacro with the arguments of your robot and import what comes out.',
    before: turning(`    <origin xyz="0 0 \${reach}"/>\n${AXIS}\n${LIMIT}`),
    after: turning(`    <origin xyz="0 0 0.35"/>\n${AXIS}\n${LIMIT}`),
  },
} as const satisfies Record<string, Rule>
