import type { Rule } from '@/lib/urdf/rule'

const robot = (body: string, version = ''): string =>
  `<robot name="r"${version}>\n  <link name="base"/>\n  <link name="arm"/>\n${body}\n</robot>`
const joint = (type: string, body: string, version = ''): string =>
  robot(`  <joint name="turn" type="${type}">\n    <parent link="base"/>\n    <child link="arm"/>\n${body}\n  </joint>`, version)
const LIMIT = '    <limit lower="-1" upper="1" effort="5" velocity="2"/>'
const AXIS = '    <axis xyz="0 0 1"/>'
const mesh = (geometry: string): string => `<robot name="r">\n  <link name="base">\n    <visual><geometry>${geometry}</geometry></visual>\n  </link>\n</robot>`
const follower = (type: string): string =>
  `<robot name="r">\n  <link name="base"/>\n  <link name="left"/>\n  <link name="right"/>\n` +
  `  <joint name="grip" type="${type}">\n    <parent link="base"/>\n    <child link="left"/>\n${AXIS}\n    <limit effort="5" velocity="2"/>\n  </joint>\n` +
  `  <joint name="follow" type="continuous">\n    <parent link="base"/>\n    <child link="right"/>\n${AXIS}\n    <limit effort="5" velocity="2"/>\n    <mimic joint="grip"/>\n  </joint>\n</robot>`

const bounded = (multiplier: number): string =>
  `<robot name="r">\n  <link name="base"/>\n  <link name="left"/>\n  <link name="right"/>\n` +
  `  <joint name="grip" type="revolute">\n    <parent link="base"/>\n    <child link="left"/>\n${AXIS}\n${LIMIT}\n  </joint>\n` +
  `  <joint name="follow" type="revolute">\n    <parent link="base"/>\n    <child link="right"/>\n${AXIS}\n${LIMIT}\n    <mimic joint="grip" multiplier="${multiplier}"/>\n  </joint>\n</robot>`
const XACRO = ' xmlns:xacro="http://www.ros.org/wiki/xacro"'

/** What is imported, but not without saying what was supplied, changed or ignored. */
export const WARNING_RULES = {
  'robot-unnamed': {
    severity: 'warning',
    title: 'The robot has no name',
    meaning: 'The attribute name of <robot> is missing, empty or blank.',
    effect: 'None on the numbers: the name is only shown. Other programs refuse such a file.',
    remedy: 'Write <robot name="…">.',
    before: '<robot>\n  <link name="base"/>\n</robot>',
    after: '<robot name="arm">\n  <link name="base"/>\n</robot>',
  },
  'axis-normalised': {
    severity: 'warning',
    title: 'A direction was brought to length 1',
    meaning: 'The axis of a joint, or a quaternion, has a length that differs from 1 by more than 1e-6.',
    effect: 'Only the direction is used: the value is divided by its length. Programs that do not divide turn the joint by a wrong angle, the asked one times that length.',
    remedy: 'Write the direction with length 1 and enough digits, such as 0 0.707106781187 0.707106781187.',
    before: joint('revolute', `    <axis xyz="0 0 2"/>\n${LIMIT}`),
    after: joint('revolute', `${AXIS}\n${LIMIT}`),
  },
  'axis-defaulted': {
    severity: 'warning',
    title: 'The axis was left out',
    meaning: 'A joint that moves has no <axis>.',
    effect: 'The joint moves about, or along, the x axis of its own frame: xyz="1 0 0" is the default of URDF.',
    remedy: 'Write the axis down, even if it is 1 0 0, so that a reader sees that it is meant.',
    before: joint('revolute', LIMIT),
    after: joint('revolute', `    <axis xyz="1 0 0"/>\n${LIMIT}`),
  },
  'limit-defaulted': {
    severity: 'warning',
    title: 'A bound was left out',
    meaning: 'A revolute or prismatic joint does not give lower, upper, or both.',
    effect: 'In URDF 1.0 and 1.1 a bound left out is 0; with both left out the joint is locked at 0. In URDF 1.2 it is unbounded.',
    remedy: 'Write both bounds down. Use type="continuous" for a joint that turns without end.',
    before: joint('revolute', `${AXIS}\n    <limit upper="1" effort="5" velocity="2"/>`),
    after: joint('revolute', `${AXIS}\n${LIMIT}`),
  },
  'range-empty': {
    severity: 'warning',
    title: 'A joint has no range',
    meaning: 'The lower and the upper limit are equal.',
    effect: 'The joint counts as a coordinate of the robot but is outside its limits everywhere except at that one position.',
    remedy: 'Give the true range, or use type="fixed" if the joint is locked.',
    before: joint('revolute', `${AXIS}\n    <limit lower="0" upper="0" effort="5" velocity="2"/>`),
    after: joint('revolute', `${AXIS}\n${LIMIT}`),
  },
  'rate-limit-unknown': {
    severity: 'warning',
    title: 'A rate limit is unknown',
    meaning: 'The velocity of a joint that moves is missing, zero or negative (or an acceleration, deceleration or jerk is zero or negative). In the wild these mean that nobody filled the value in.',
    effect: 'The value is unknown and is never used: commanded rates of this joint are not scaled down.',
    remedy: 'Take the value from the data sheet and write it down, in rad/s or m/s.',
    before: joint('revolute', `${AXIS}\n    <limit lower="-1" upper="1" effort="5" velocity="0"/>`),
    after: joint('revolute', `${AXIS}\n${LIMIT}`),
  },
  'continuous-with-range': {
    severity: 'warning',
    title: 'A continuous joint gives bounds',
    meaning: 'A joint of type continuous has lower or upper. By definition it turns without end.',
    effect: 'The bounds are ignored: the joint is computed without stops.',
    remedy: 'Use type="revolute" if the stops are real; else delete the bounds.',
    before: joint('continuous', `${AXIS}\n${LIMIT}`),
    after: joint('continuous', `${AXIS}\n    <limit effort="5" velocity="2"/>`),
  },
  'mimic-leaves-range': {
    severity: 'warning',
    title: 'A following joint would leave its range',
    meaning: 'A joint that mimics another is asked beyond its own limits when the one that it follows moves over its range: multiplier times a bound of the leader, plus the offset, lies outside.',
    effect: 'The range of the leader is cut to what all that follow it allow. Programs that look at the limits of the leader only drive the follower into its stop.',
    remedy: 'Correct the multiplier and the offset, or the limits of one of the two joints, so that both reach their ends together.',
    before: bounded(2),
    after: bounded(1),
  },
  'mimic-of-fixed': {
    severity: 'warning',
    title: 'A joint mimics one that does not move',
    meaning: 'The joint that is followed, directly or through others, is fixed.',
    effect: 'The following joint is not a coordinate: it is held at its offset.',
    remedy: 'Name the joint that drives it, or make this joint fixed too.',
    before: follower('fixed'),
    after: follower('continuous'),
  },
  'xacro-leftover': {
    severity: 'warning',
    title: 'Macros were left in the file',
    meaning: 'The file has xacro elements that define something but stand for nothing themselves, or macros and ${…} where nothing that is computed depends on them, such as in the inertia or the shape of a link.',
    effect: 'They are ignored. Links and joints inside the definition of a macro do not exist until xacro has expanded it.',
    remedy: 'Run the file through xacro and import what comes out, if the robot is not complete without them; else delete them.',
    before: `<robot name="r"${XACRO}>\n  <xacro:property name="reach" value="0.35"/>\n  <link name="base"/>\n</robot>`,
    after: `<robot name="r"${XACRO}>\n  <link name="base"/>\n</robot>`,
  },
  'namespace-undeclared': {
    severity: 'warning',
    title: 'A prefix is used without a declaration',
    meaning: 'A name such as gz:plugin has a prefix before its colon, and neither the element nor one around it declares the prefix by xmlns:gz="…". Each prefix is reported once.',
    effect: 'None on the numbers. Programs that look at namespaces refuse the whole file.',
    remedy: 'Declare the prefix in <robot>, or take the prefix away.',
    before: '<robot name="r">\n  <link name="base" gz:static="true"/>\n</robot>',
    after: '<robot name="r" xmlns:gz="https://arm.example/gz">\n  <link name="base" gz:static="true"/>\n</robot>',
  },
  'closed-loop-ignored': {
    severity: 'warning',
    title: 'A closed loop stays open',
    meaning: 'The file closes a loop of links by an element of its vendor, such as <loop_joint>. URDF has trees only and no such element.',
    effect: 'The element is ignored: the joints of the loop are computed as if each moved on its own, although in reality they depend on each other.',
    remedy: 'Describe the dependent joints by <mimic> where the ratio is constant; else compute only chains that do not pass the loop.',
    before: '<robot name="r">\n  <link name="base"/>\n  <loop_joint name="bar" type="revolute">\n    <link1 link="base"/>\n    <link2 link="base"/>\n  </loop_joint>\n</robot>',
    after: '<robot name="r">\n  <link name="base"/>\n</robot>',
  },
  'unit-suspect': {
    severity: 'warning',
    title: 'Values look like degrees or millimetres',
    meaning: 'URDF is in radians and metres. One of these holds: more than half of the revolute joints, and two at least, have limits between 30 and 1000; an rpy is beyond 10 and no multiple of a quarter turn in radians; the middle distance between joints further out than the first is 30 or more; a slide is 10 or longer and moves at 20 or more. Each kind is reported once.',
    effect: 'The values are read as radians and metres all the same: poses and limits are wrong if something else was meant.',
    remedy: 'Convert the file, angles by pi / 180 and lengths by 1 / 1000, or ask the supplier. If the values are meant as they stand, nothing needs to be done.',
    before: joint('revolute', `    <origin xyz="0 0 0.2" rpy="0 0 45"/>\n${AXIS}\n${LIMIT}`),
    after: joint('revolute', `    <origin xyz="0 0 0.2" rpy="0 0 0.7853981633974483"/>\n${AXIS}\n${LIMIT}`),
  },
  'unknown-attribute': {
    severity: 'warning',
    title: 'An attribute is unknown',
    meaning: 'A joint, or one of its elements that enter the computation, has an attribute that URDF does not have there. Attributes with a prefix are vendors\' own and do not count.',
    effect: 'It is ignored. If it is a slip of the pen, the default is used in its place.',
    remedy: 'Correct the name of the attribute, or delete it.',
    before: joint('revolute', `    <origin xyz="0 0 0.2" ryp="0 0 0.5"/>\n${AXIS}\n${LIMIT}`),
    after: joint('revolute', `    <origin xyz="0 0 0.2" rpy="0 0 0.5"/>\n${AXIS}\n${LIMIT}`),
  },
  'mesh-missing': {
    severity: 'warning',
    title: 'A mesh is not in the upload',
    meaning: 'A link refers to a mesh file that is not in the archive, or names none; each is reported once, at its first use. A file that was sent alone has no meshes with it, which is said once.',
    effect: 'None on the numbers: kinematics needs no mesh. The shape of the link is not shown.',
    remedy: 'Nothing needs to be done for the computation.',
    before: mesh('<mesh filename="package://arm_description/meshes/base.stl"/>'),
    after: mesh('<cylinder radius="0.1" length="0.2"/>'),
  },
  'mesh-outside': {
    severity: 'warning',
    title: 'A mesh lies outside the upload',
    meaning: 'A link refers to a mesh by an absolute path, an address such as file: or http:, or a path that leads up by "..".',
    effect: 'None on the numbers. The path is never followed, and the shape of the link is not shown.',
    remedy: 'Put the mesh beside the file or below it, and refer to it by package://name/path or a relative path.',
    before: mesh('<mesh filename="file:///home/arm/base.stl"/>'),
    after: mesh('<sphere radius="0.1"/>'),
  },
  'floating-or-planar': {
    severity: 'warning',
    title: 'A joint has several degrees of freedom',
    meaning: 'The type is floating or planar: one joint with six or three coordinates.',
    effect: 'It is imported, but chains that pass through it are not computed. Chains beyond or before it are.',
    remedy: 'If the motion matters, describe it by single prismatic and revolute joints in series.',
    before: joint('planar', AXIS),
    after: joint('prismatic', `    <axis xyz="1 0 0"/>\n${LIMIT}`),
  },
  'version-unknown': {
    severity: 'warning',
    title: 'The version of the format is unknown',
    meaning: 'The version of <robot> is none of 1.0, 1.1 and 1.2.',
    effect: 'The file is read as version 1.0, so bounds left out count as 0.',
    remedy: 'Write version="1.0", "1.1" or "1.2", whichever the file was made for; left out, it is 1.0.',
    before: joint('revolute', `${AXIS}\n${LIMIT}`, ' version="3"'),
    after: joint('revolute', `${AXIS}\n${LIMIT}`, ' version="1.0"'),
  },
  'later-version-feature': {
    severity: 'warning',
    title: 'Something belongs to a later version',
    meaning: 'The file uses quat_xyzw or a capsule (new in URDF 1.1) or acceleration, deceleration or jerk (new in URDF 1.2), but says an earlier version, or none, which means 1.0.',
    effect: 'The value is used here. A program that reads the file by its stated version ignores it and computes something else.',
    remedy: 'State the version that the file needs, or write the orientation as rpy.',
    before: joint('revolute', `    <origin xyz="0 0 0.2" quat_xyzw="0 0 0 1"/>\n${AXIS}\n${LIMIT}`),
    after: joint('revolute', `    <origin xyz="0 0 0.2" quat_xyzw="0 0 0 1"/>\n${AXIS}\n${LIMIT}`, ' version="1.1"'),
  },
} as const satisfies Record<string, Rule>
