import type { Rule } from '@/lib/urdf/rule'

const robot = (body: string): string => `<robot name="r">\n${body}\n</robot>`
const link = (body: string): string => robot(`  <link name="base">\n${body}\n  </link>`)
const limited = (lower: string, upper: string): string =>
  robot(
    `  <link name="base"/>\n  <link name="arm"/>\n  <joint name="turn" type="revolute">\n    <parent link="base"/>\n    <child link="arm"/>\n    <axis xyz="0 0 1"/>\n` +
      `    <limit lower="${lower}" upper="${upper}" effort="5" velocity="2"/>\n  </joint>`,
  )
const inertial = (izz: string): string =>
  link(`    <inertial>\n      <mass value="2"/>\n      <inertia ixx="0.01" ixy="0" ixz="0" iyy="0.01" iyz="0" izz="${izz}"/>\n    </inertial>`)

/** What is worth knowing and changes no number. */
export const NOTE_RULES = {
  'limit-rounded-up': {
    severity: 'note',
    title: 'A limit was rounded up',
    meaning: 'A bound is a multiple of a quarter turn, such as pi, rounded to a value that is a little larger.',
    effect: 'The bound is used as written. A controller whose limit is the exact value refuses what lies between the two.',
    remedy: 'Write the bound with more digits, or round it down: 3.1415 in place of 3.1416.',
    before: limited('-3.1416', '3.1416'),
    after: limited('-3.1415', '3.1415'),
  },
  'range-beyond-turn': {
    severity: 'note',
    title: 'A joint turns more than once',
    meaning: 'A revolute joint has a range of more than one turn.',
    effect: 'The range is used as written. Several values of the joint give the same pose, so the same pose can be reached with the cable wound up or not.',
    remedy: 'Nothing needs to be done if the joint really turns so far. Check the unit if the numbers look like degrees, and use type="continuous" if there is no stop.',
    before: limited('-6', '6'),
    after: limited('-3', '3'),
  },
  'inertia-implausible': {
    severity: 'note',
    title: 'No body has this inertia',
    meaning: 'A mass is negative, a value is not a number, or the moments of inertia are those of no body: each principal moment is at most the sum of the other two. A link with nothing but zeros stands for one without a body and is not mentioned.',
    effect: 'None on the numbers: masses do not enter kinematics. A simulator will refuse the link or become unstable.',
    remedy: 'Have the values computed again, about the centre of mass and in kg and m.',
    before: inertial('0.03'),
    after: inertial('0.015'),
  },
  'visual-only-element': {
    severity: 'note',
    title: 'Something that concerns the looks is not shown',
    meaning: 'The file covers a material with a picture, or gives a shape that URDF does not have.',
    effect: 'None on the numbers. The picture or the shape is kept in the file and not shown.',
    remedy: 'Nothing needs to be done for the computation. Shapes are box, cylinder, sphere, capsule and mesh.',
    before: link('    <visual><geometry><cone radius="0.1" length="0.2"/></geometry></visual>'),
    after: link('    <visual><geometry><cylinder radius="0.1" length="0.2"/></geometry></visual>'),
  },
  'unknown-element': {
    severity: 'note',
    title: 'An element is not used',
    meaning: 'The file has an element that is not part of URDF at this place, such as <gazebo>, <transmission> or a tag of a vendor. Each name and place is reported once, with how often it is met.',
    effect: 'None on the numbers: the element and all in it are kept in the file and not used.',
    remedy: 'Nothing needs to be done if it is meant for another program. Check the spelling if it was meant for this one.',
    before: robot('  <link name="base"/>\n  <gazebo reference="base">\n    <material>Blue</material>\n  </gazebo>'),
    after: robot('  <link name="base"/>'),
  },
  'name-unusual': {
    severity: 'note',
    title: 'Names have unusual characters',
    meaning: 'Names of links or joints have other characters than the letters A to Z, digits, underscore and hyphen: a slash, a blank, a dot, a letter with an accent. They are reported together, once.',
    effect: 'None on the numbers. The names are kept as they are; some other program may not take them, and they need care in addresses and scripts.',
    remedy: 'Rename them if a program that you use does not take them.',
    before: robot('  <link name="left arm/base"/>'),
    after: robot('  <link name="left_arm_base"/>'),
  },
} as const satisfies Record<string, Rule>
