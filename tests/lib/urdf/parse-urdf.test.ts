import { describe, expect, it } from 'vitest'
import type { RuleId } from '@/lib/urdf/rules'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { RULES } from '@/lib/urdf/rules'
import { ARCHIVE_RULES } from '@/lib/urdf/rules-of-archive'
import { AXIS, bytesOf, joint, LIMIT, links, marked, parse, robot, rulesOf, turning } from './urdf-text'

/** Whatever stands in a colour is looked at by nobody. */
const inColor = (body: string): string => `<material name="m"><color>${body}</color></material>`
const shape = (body: string): string => robot(`<link name="a"><visual><geometry>${body}</geometry></visual></link>`)
const inertia = (mass: string, moments: string): string => robot(`<link name="a"><inertial>${mass}${moments}</inertial></link>`)
const MOMENTS = '<inertia ixx="1" ixy="0" ixz="0" iyy="1" iyz="0" izz="1"/>'
const follower = (limit: string, mimic: string): string =>
  robot(links('a', 'b', 'c') + joint('j', 'a', 'b', AXIS + LIMIT, 'revolute') + joint('k', 'a', 'c', AXIS + limit + mimic, 'revolute'))
const XACRO = ' xmlns:xacro="http://www.ros.org/wiki/xacro"'

/** Each text has ¦ where the finding is expected; the mark is taken out before reading. */
const PLACES: readonly (readonly [RuleId, string, string])[] = [
  ['not-urdf', 'an element that is not a robot', '<?xml version="1.0"?>\n  ¦<model/>'],
  ['no-links', 'a robot without links', '\n ¦<robot name="r"/>'],
  ['no-links', 'links that stand inside other elements', `¦${robot(inColor('<link name="a"/>'))}`],
  ['duplicate-link', 'a second link of a name', robot('<link name="a"/>\n<link name="¦a"/>')],
  ['duplicate-joint', 'a second joint of a name', robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b')}\n${joint('¦j', 'a', 'c')}`)],
  ['name-missing', 'a link without a name', robot('\n\t¦<link/>')],
  ['name-missing', 'a link with a blank name', robot('<link name="¦ "/>')],
  ['name-missing', 'a joint without a name', robot(`${links('a', 'b')}¦<joint type="fixed"><parent link="a"/><child link="b"/></joint>`)],
  ['joint-incomplete', 'a joint without a type', robot(`${links('a', 'b')}¦<joint name="j"><parent link="a"/><child link="b"/></joint>`)],
  ['joint-incomplete', 'a joint without a parent', robot(`${links('b')}\n ¦<joint name="j" type="fixed"><child link="b"/></joint>`)],
  ['joint-incomplete', 'a joint without a child', robot(`${links('a')}\n ¦<joint name="j" type="fixed"><parent link="a"/></joint>`)],
  ['joint-incomplete', 'a parent without a link', robot(`${links('a', 'b')}<joint name="j" type="fixed">¦<parent/><child link="b"/></joint>`)],
  ['joint-incomplete', 'a second child', robot(`${links('a', 'b')}${joint('j', 'a', 'b', '\n¦<child link="a"/>')}`)],
  ['joint-incomplete', 'a second axis', turning(`${AXIS}¦<axis xyz="1 0 0"/>${LIMIT}`)],
  ['joint-incomplete', 'a second limit', turning(`${AXIS}${LIMIT}¦<limit lower="-2" upper="2"/>`)],
  ['joint-type-unknown', 'a type in capitals', turning('', '', '¦Fixed')],
  ['joint-type-unknown', 'an empty type', turning('', '', '¦')],
  ['link-undeclared', 'a child that is misspelt', robot(`${links('a', 'b')}\n  ${joint('j', 'a', '¦B')}`)],
  ['link-undeclared', 'a parent inside another element', robot(links('b') + inColor('<link name="a"/>') + joint('j', '¦a', 'b'))],
  ['several-roots', 'three pieces', robot(`<link name="a"/>\n¦<link name="b"/>\n<link name="c"/>`)],
  ['two-parents', 'a second joint into one link', robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b')}${joint('k', 'a', 'c')}\n${joint('l', 'b', '¦c')}`)],
  ['cycle', 'a loop through the base', robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b')}${joint('k', 'b', 'c')}\n${joint('l', 'c', '¦a')}`)],
  ['cycle', 'a loop beyond the base', robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b')}${joint('k', 'b', 'c')}\n${joint('l', 'c', '¦b')}`)],
  ['cycle', 'a loop written from its end', robot(`${links('a', 'b', 'c')}${joint('l', 'c', 'a')}${joint('k', 'b', 'c')}\n${joint('j', 'a', '¦b')}`)],
  ['cycle', 'a joint from a link to itself', robot(`${links('a', 'b')}${joint('j', 'a', 'b')}${joint('k', 'b', '¦b')}`)],
  ['axis-zero', 'an axis of zeros', turning(`<axis xyz="¦0 0 0"/>${LIMIT}`)],
  ['axis-zero', 'an axis of noise', turning(`<axis xyz="¦1e-17 0 5e-10"/>${LIMIT}`)],
  ['axis-zero', 'an axis without xyz', turning(`\n  ¦<axis/>${LIMIT}`)],
  ['number-malformed', 'NaN', turning(`<origin xyz="¦0 nan 0"/>${AXIS}${LIMIT}`)],
  ['number-malformed', 'infinity', turning(`${AXIS}<limit lower="¦-inf" upper="1" velocity="2"/>`)],
  ['number-malformed', 'a hexadecimal number', turning(`<origin rpy="¦0x1 0 0"/>${AXIS}${LIMIT}`)],
  ['number-malformed', 'a decimal comma', turning(`<origin xyz="¦0 0 0,35"/>${AXIS}${LIMIT}`)],
  ['number-malformed', 'overflow', turning(`<origin xyz="¦0 0 1e400"/>${AXIS}${LIMIT}`)],
  ['number-malformed', 'a length beyond 1e9', turning(`<origin xyz="¦0 0 1.1e9"/>${AXIS}${LIMIT}`)],
  ['number-malformed', 'too few numbers', turning(`<axis xyz="¦0 1"/>${LIMIT}`)],
  ['number-malformed', 'too many numbers', turning(`${AXIS}<limit lower="-1" upper="¦1 2" velocity="2"/>`)],
  ['number-malformed', 'an empty value', turning(`${AXIS}<limit lower="-1" upper="1" velocity="¦"/>`)],
  ['number-malformed', 'a unit behind a number', turning(`<origin xyz="¦0 0 350mm"/>${AXIS}${LIMIT}`)],
  ['number-malformed', 'a quaternion far from length 1', turning(`<origin quat_xyzw="¦0 0 0 2"/>${AXIS}${LIMIT}`, ' version="1.1"')],
  ['number-malformed', 'a quaternion of zeros', turning(`<origin quat_xyzw="¦0 0 0 0"/>${AXIS}${LIMIT}`, ' version="1.1"')],
  ['limit-missing', 'a revolute joint', robot(`${links('a', 'b')}\n ¦${joint('j', 'a', 'b', AXIS, 'revolute')}`)],
  ['limit-missing', 'a prismatic joint of version 1.1', robot(`${links('a', 'b')}¦${joint('j', 'a', 'b', AXIS, 'prismatic')}`, ' version="1.1"')],
  ['limit-inverted', 'bounds exchanged', turning(`${AXIS}<limit lower="¦1" upper="-1" velocity="2"/>`)],
  ['mimic-missing', 'a leader that is not there', turning(`${AXIS}${LIMIT}<mimic joint="¦other"/>`)],
  ['mimic-missing', 'no leader at all', turning(`${AXIS}${LIMIT}¦<mimic multiplier="2"/>`)],
  ['mimic-self', 'itself', turning(`${AXIS}${LIMIT}<mimic joint="¦turn"/>`)],
  ['orientation-twice', 'rpy and quaternion', turning(`<origin rpy="0 0 0" quat_xyzw="¦0 0 0 1"/>${AXIS}${LIMIT}`, ' version="1.1"')],
  ['xacro-unexpanded', 'a number', turning(`<origin xyz="¦0 0 \${l1}"/>${AXIS}${LIMIT}`)],
  ['xacro-unexpanded', 'a name', robot('<link name="¦${prefix}base"/>')],
  ['xacro-unexpanded', 'an argument', turning(`<origin xyz="¦$(arg x) 0 0"/>${AXIS}${LIMIT}`)],
  ['xacro-unexpanded', 'a macro that is called', robot(`<link name="a"/>\n ¦<xacro:wrist prefix=""/>`, XACRO)],
  ['xacro-unexpanded', 'a macro inside a joint', turning(`${AXIS}${LIMIT}¦<xacro:dynamics/>`, XACRO)],
  ['axis-normalised', 'an axis of length 2', turning(`\n<axis xyz="¦0 0 2"/>${LIMIT}`)],
  ['axis-normalised', 'a quaternion a little off', turning(`<origin quat_xyzw="¦0 0 0 1.0005"/>${AXIS}${LIMIT}`, ' version="1.1"')],
  ['axis-defaulted', 'no axis', robot(`${links('a', 'b')}\n¦${joint('j', 'a', 'b', LIMIT, 'prismatic')}`)],
  ['limit-defaulted', 'no lower bound', turning(`${AXIS}\n¦<limit upper="1" velocity="2"/>`)],
  ['limit-defaulted', 'no bound', turning(`${AXIS}¦<limit velocity="2"/>`)],
  ['limit-defaulted', 'no bound in version 1.2', turning(`${AXIS}¦<limit velocity="2"/>`, ' version="1.2"')],
  ['range-empty', 'equal bounds', turning(`${AXIS}<limit lower="¦0.5" upper="0.5" velocity="2"/>`)],
  ['rate-limit-unknown', 'no rate', turning(`${AXIS}\n ¦<limit lower="-1" upper="1"/>`)],
  ['rate-limit-unknown', 'a rate of 0', turning(`${AXIS}<limit lower="-1" upper="1" velocity="¦0"/>`)],
  ['rate-limit-unknown', 'a rate of -1', turning(`${AXIS}<limit lower="-1" upper="1" velocity="¦-1"/>`)],
  ['rate-limit-unknown', 'a continuous joint without limit', robot(`${links('a', 'b')}¦${joint('j', 'a', 'b', AXIS, 'continuous')}`)],
  ['rate-limit-unknown', 'an acceleration of 0', turning(`${AXIS}<limit lower="-1" upper="1" velocity="1" acceleration="¦0"/>`, ' version="1.2"')],
  ['continuous-with-range', 'bounds on a continuous joint', turning(`${AXIS}<limit lower="¦-1" upper="1" velocity="2"/>`, '', 'continuous')],
  ['continuous-with-range', 'an upper bound alone', turning(`${AXIS}<limit upper="¦1" velocity="2"/>`, '', 'continuous')],
  ['floating-or-planar', 'a floating joint', turning('', '', '¦floating')],
  ['version-unknown', 'a version of the future', robot(links('a'), ' version="¦2"')],
  ['later-version-feature', 'an acceleration in version 1.1', turning(`${AXIS}<limit lower="-1" upper="1" velocity="1" ¦acceleration="3"/>`, ' version="1.1"')],
  ['xacro-leftover', 'a property', robot(`${links('a')}¦<xacro:property name="x" value="1"/>`, XACRO)],
  ['too-deep', 'level 65', `<robot>${'<a>'.repeat(63)}¦<a>${'</a>'.repeat(64)}</robot>`],
  ['too-many-attributes', 'attribute 65', `<robot>¦<a ${Array.from({ length: 65 }, (_, i) => `a${i}=""`).join(' ')}/></robot>`],
  ['name-too-long', 'a link', robot(`<link name="¦${'e'.repeat(257)}"/>`)],
  ['name-too-long', 'an element', robot(links('a') + inColor(`¦<${'x'.repeat(257)}/>`))],
  ['name-too-long', 'an attribute', robot(`<link name="a" ¦${'x'.repeat(257)}=""/>`)],
  ['too-many-elements', 'element 200 001', `<robot>${'<a/>'.repeat(199_999)}¦<a/></robot>`],
  ['text-after-robot', 'text', '<robot name="r"><link name="a"/></robot>\n ¦x'],
  ['text-after-robot', 'another element', '<robot name="r"><link name="a"/></robot>\n¦<link name="b"/>'],
  ['doctype-refused', 'a document type', '<?xml version="1.0"?>\n¦<!DOCTYPE robot>\n<robot/>'],
  ['doctype-refused', 'an entity', '<robot>\n¦<!ENTITY a "b">\n</robot>'],
  ['not-xml', 'JSON', '¦{"robot": "r"}'],
  ['encoding-unsupported', 'an encoding of old', '<?xml version="1.0" encoding="¦ISO-8859-1"?><robot/>'],
  ['xml-malformed', 'a tag that is not closed', '<robot>\n  ¦<link name="a">\n'],
  ['robot-unnamed', 'no name', `\n¦<robot>${links('a')}</robot>`],
  ['robot-unnamed', 'a blank name', `<robot name="¦ ">${links('a')}</robot>`],
  ['mimic-cycle', 'two joints', robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b', `${AXIS}${LIMIT}<mimic joint="k"/>`, 'revolute')}${joint('k', 'a', 'c', `${AXIS}${LIMIT}<mimic joint="¦j"/>`, 'revolute')}`)],
  ['mimic-of-fixed', 'one joint', robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b')}${joint('k', 'a', 'c', `${AXIS}${LIMIT}<mimic joint="¦j"/>`, 'revolute')}`)],
  ['mimic-leaves-range', 'a multiplier of 2', follower(LIMIT, '<mimic joint="¦j" multiplier="2"/>')],
  ['mimic-leaves-range', 'an offset', follower(LIMIT, '<mimic joint="¦j" offset="-0.1"/>')],
  ['mimic-leaves-range', 'a multiplier of 0 with an offset out of range', follower(LIMIT, '<mimic joint="¦j" multiplier="0" offset="1.5"/>')],
  ['mimic-leaves-range', 'a leader without end', robot(links('a', 'b', 'c') + joint('j', 'a', 'b', `${AXIS}<limit velocity="1"/>`, 'continuous') + joint('k', 'a', 'c', `${AXIS}${LIMIT}<mimic joint="¦j"/>`, 'revolute'))],
  ['closed-loop-ignored', 'a loop joint', robot(`${links('a')}\n ¦<loop_joint name="l" type="ball"><link1 link="a"/></loop_joint>`)],
  ['closed-loop-ignored', 'a constraint', robot(`${links('a')}¦<constraint/>`)],
  ['namespace-undeclared', 'an element', robot(`${links('a')}${inColor('¦<gz:a/><gz:b/>')}`)],
  ['namespace-undeclared', 'an attribute', robot('<link name="a" ¦gz:b="1"/>')],
  ['namespace-undeclared', 'a prefix that is declared further in', robot(inColor('<x xmlns:gz="a:b" gz:c=""/>') + links('a') + inColor('<y ¦gz:c=""/>'))],
  ['unit-suspect', 'a rotation of 90', turning(`<origin rpy="¦0 0 90"/>${AXIS}${LIMIT}`)],
  ['mesh-missing', 'a file alone', shape('<mesh filename="¦package://r/a.stl"/>')],
  ['mesh-missing', 'no file', shape('¦<mesh scale="1 1 1"/>')],
  ['mesh-missing', 'an empty name', shape('<mesh filename="¦"/>')],
  ['mesh-outside', 'an absolute path', shape('<mesh filename="¦/srv/a.stl"/>')],
  ['mesh-outside', 'a way up', shape('<mesh filename="¦package://r/../a.stl"/>')],
  ['mesh-outside', 'an address', shape('<mesh filename="¦https://meshes.example/a.stl"/>')],
  ['mesh-outside', 'a drive', shape('<mesh filename="¦C:\\a.stl"/>')],
  ['unknown-attribute', 'an origin', turning(`<origin ¦xzy="1 2 3"/>${AXIS}${LIMIT}`)],
  ['unknown-attribute', 'a mimic', follower(LIMIT, '<mimic joint="j" ¦multiplyer="-1"/>')],
  ['xacro-leftover', 'a value that nobody needs', shape('<box size="¦${a} 1 1"/>')],
  ['xacro-leftover', 'a macro that nobody needs', robot('<link name="a">\n¦<xacro:inertia mass="1"/></link>', XACRO)],
  ['xacro-leftover', 'a value in the dynamics of a joint', turning(`${AXIS}${LIMIT}<dynamics damping="¦$(arg d)"/>`)],
  ['later-version-feature', 'a capsule in version 1.0', shape('¦<capsule radius="0.1" length="0.2"/>')],
  ['later-version-feature', 'a quaternion in version 1.0', turning(`<origin ¦quat_xyzw="0 0 0 1"/>${AXIS}${LIMIT}`)],
  ['limit-rounded-up', 'pi with four decimals', turning(`${AXIS}<limit lower="-3" upper="¦3.1416" velocity="1"/>`)],
  ['limit-rounded-up', 'a quarter turn with three decimals', turning(`${AXIS}<limit lower="¦-1.571" upper="1.5" velocity="1"/>`)],
  ['range-beyond-turn', 'two turns', turning(`${AXIS}<limit lower="¦-6.2" upper="6.2" velocity="1"/>`)],
  ['inertia-implausible', 'a negative mass', inertia('<mass value="¦-1"/>', MOMENTS)],
  ['inertia-implausible', 'a mass in words', inertia('<mass value="¦heavy"/>', MOMENTS)],
  ['inertia-implausible', 'a moment larger than the sum of the others', inertia('<mass value="1"/>', '¦<inertia ixx="1" ixy="0" ixz="0" iyy="1" iyz="0" izz="2.1"/>')],
  ['inertia-implausible', 'a product larger than the moments', inertia('<mass value="1"/>', '¦<inertia ixx="1" ixy="1.2" ixz="0" iyy="1" iyz="0" izz="1"/>')],
  ['inertia-implausible', 'a negative moment', inertia('<mass value="1"/>', '¦<inertia ixx="-1" ixy="0" ixz="0" iyy="-1" iyz="0" izz="-1"/>')],
  ['visual-only-element', 'a shape', shape('¦<plane normal="0 0 1"/>')],
  ['visual-only-element', 'a picture', robot(`${links('a')}<material name="m"><texture filename="¦wood.png"/></material>`)],
  ['unknown-element', 'a drive', robot(`${links('a')}¦<transmission name="t"><joint name="j"/></transmission><transmission name="u"/>`)],
  ['unknown-element', 'inside a link', robot('<link name="a">¦<contact/></link>')],
  ['unknown-element', 'inside a joint', turning(`${AXIS}${LIMIT}¦<axis2 xyz="0 0 1"/>`)],
  ['name-unusual', 'a link and a joint', robot(`<link name="a"/><link name="¦b.c"/>${joint('a/b', 'a', 'b.c')}`)],
]

describe('the table of places', () => {
  it('has every rule but those of archives and the two that take a large file or a clock', () => {
    const shown = new Set(PLACES.map(([rule]) => rule))
    expect(Object.keys(RULES).filter((rule) => !(rule in ARCHIVE_RULES) && !shown.has(rule as RuleId))).toEqual(['too-large', 'reading-given-up'])
  })
})

describe('parseUrdf', () => {
  it.each(PLACES)('reports %s and nothing else, at its place: %s', (rule, _what, source) => {
    const { text, line, column } = marked(source)
    const { findings } = parse(text)
    expect(findings.map((finding) => [finding.rule, finding.line, finding.column])).toEqual([[rule, line, column]])
  })

  it('reports a file beyond 8 MiB as too large, whatever is in it', () => {
    const { description, findings } = parse(`<robot name="r"><link name="a"/>${' '.repeat(20_000_000)}</robot>`)
    expect([description, findings.map(({ rule, line, column }) => [rule, line, column])]).toEqual([null, [['too-large', 1, 1]]])
  })

  it('reports every broken joint with its line, not only the first', () => {
    const { description, findings } = parse(`<robot name="r">
  <link name="a"/><link name="b"/><link name="c"/><link name="d"/>
  ${joint('j', 'a', 'b', '<axis xyz="0 0 0"/>' + LIMIT, 'revolute')}
  ${joint('k', 'b', 'c', AXIS, 'revolute')}
  ${joint('l', 'c', 'x', '<origin xyz="a b"/>')}
</robot>`)
    expect(description).toBeNull()
    expect(findings.map(({ rule, line, element }) => [rule, line, element])).toEqual([
      ['axis-zero', 3, "joint 'j'"],
      ['limit-missing', 4, "joint 'k'"],
      ['link-undeclared', 5, "joint 'l'"],
      ['number-malformed', 5, "joint 'l'"],
    ])
  })

  it('refuses a loop of links and names the link that closes it', () => {
    const [finding] = parse(robot(`${links('a', 'b', 'c')}${joint('j', 'a', 'b')}${joint('k', 'b', 'c')}${joint('l', 'c', 'a')}`)).findings
    expect(finding!.message).toBe("The links 'a', 'b' and 'c' form a loop, which this joint closes: it leads from 'c' back to 'a'.")
    expect(finding!.element).toBe("joint 'l'")
  })

  it('reports each of several loops', () => {
    const text = robot(links('a', 'b', 'c', 'd', 'e') + joint('j', 'a', 'b') + joint('k', 'b', 'a') + joint('l', 'c', 'd') + joint('m', 'd', 'c'))
    expect(rulesOf(parse(text).findings)).toEqual(['cycle', 'cycle'])
  })

  it('lists all roots with their lines', () => {
    const [finding] = parse('<robot name="r">\n<link name="a"/>\n<link name="b"/>\n<link name="c"/></robot>').findings
    expect(finding!.message).toBe("3 links are the child of no joint: 'a' (line 2), 'b' (line 3) and 'c' (line 4).")
  })

  it('does not report as separate pieces what a broken joint leaves over', () => {
    expect(rulesOf(parse(robot(links('a', 'b', 'c') + joint('j', 'a', 'b') + joint('k', 'b', 'C'))).findings)).toEqual(['link-undeclared'])
  })

  it('names the link that was probably meant', () => {
    const [finding] = parse(robot(links('base-link', 'tool') + joint('j', 'Base_Link', 'tool'))).findings
    expect(finding!.message).toContain("The file has 'base-link'.")
  })

  it('reports a circle of mimics once, at the last joint in it, and not those who follow it', () => {
    const follow = (name: string, child: string, leader: string) => joint(name, 'base', child, `${AXIS}${LIMIT}<mimic joint="${leader}"/>`, 'revolute')
    const { findings } = parse(robot(`${links('base', 'a', 'b', 'c', 'd')}${follow('a', 'a', 'b')}${follow('b', 'b', 'c')}\n${follow('c', 'c', 'a')}${follow('d', 'd', 'a')}`))
    expect(findings.map(({ rule, line, element }) => [rule, line, element])).toEqual([['mimic-cycle', 2, "joint 'c'"]])
  })

  it('warns of every joint that follows a fixed one, directly or through others', () => {
    const follow = (name: string, child: string, leader: string) => joint(name, 'base', child, `${AXIS}${LIMIT}<mimic joint="${leader}"/>`, 'revolute')
    const { findings } = parse(robot(`${links('base', 'a', 'b', 'c')}${joint('lead', 'base', 'a')}${follow('b', 'b', 'lead')}${follow('c', 'c', 'b')}`))
    expect(findings.map(({ rule, element }) => [rule, element])).toEqual([['mimic-of-fixed', "joint 'b'"], ['mimic-of-fixed', "joint 'c'"]])
  })

  it('says once of a file alone how many meshes it has not, and keeps their names as written', () => {
    const mesh = (filename: string) => `<geometry><mesh filename="${filename}"/></geometry>`
    const { description, findings } = parse(robot(`<link name="a"><visual>${mesh('package://arm/a.stl')}</visual>\n<collision>${mesh('package://arm/a.stl')}</collision>
      <collision>${mesh('b.stl')}</collision></link>`))
    expect(findings.map(({ rule, line, element }) => [rule, line, element])).toEqual([['mesh-missing', 1, "link 'a'"]])
    expect(findings[0]!.message).toContain("2 meshes, first 'package://arm/a.stl'")
    expect(description!.links[0]!.meshes).toEqual(['package://arm/a.stl', 'package://arm/a.stl', 'b.stl'])
  })

  it('says of each mesh of an archive that is not in it, at its first use', () => {
    const mesh = (filename: string) => `<collision><geometry><mesh filename="${filename}"/></geometry></collision>\n`
    const text = robot(`<link name="a">${['package://arm/a.stl', 'package://arm/b.stl', 'c.stl', 'c.stl', '../d.stl'].map(mesh).join('')}</link>`)
    const { findings } = parseUrdf(bytesOf(text), { files: ['arm/arm.urdf', 'arm/a.stl'] })
    expect(findings.map(({ rule, line }) => [rule, line])).toEqual([['mesh-missing', 2], ['mesh-missing', 3], ['mesh-outside', 5]])
  })

  it('quotes a long value by its beginning only', () => {
    const [finding] = parse(turning(`<origin xyz="${'1 '.repeat(5000)}"/>${AXIS}${LIMIT}`)).findings
    expect(finding!.message.length).toBeLessThan(200)
  })

  it('lists 3 000 faults of one kind', () => {
    expect(parse(robot('<link/>'.repeat(3000))).findings.filter(({ rule }) => rule === 'name-missing')).toHaveLength(3000)
  })

  it('lists a fault that is repeated without end five thousand times, and counts the rest', () => {
    const { findings } = parse(robot('<link/>'.repeat(5500)))
    const named = findings.filter(({ rule }) => rule === 'name-missing')
    expect(named).toHaveLength(5000)
    expect(named.at(-1)!.message).toMatch(/ The same holds at 500 further places, which are not listed\.$/)
  })

  it('counts columns in characters, not in bytes or UTF-16 code units', () => {
    const [finding] = parse('<robot name="🤖é"><link/></robot>').findings
    expect([finding!.line, finding!.column]).toEqual([1, 18])
  })

  it.each(['\n', '\r\n', '\r'])('counts lines that end in %j', (end) => {
    const [finding] = parse(`<robot name="r">${end}${end}<link/></robot>`).findings
    expect([finding!.line, finding!.column]).toEqual([3, 1])
  })

  it('gives every finding the severity and remedy of its rule', () => {
    const [finding] = parse(turning(`<axis xyz="0 0 2"/>${LIMIT}`)).findings
    expect(finding).toEqual({
      rule: 'axis-normalised',
      severity: 'warning',
      message: "The axis xyz='0 0 2' has length 2, not 1; 0 0 1 is used.",
      remedy: expect.stringContaining('Write the direction with length 1'),
      line: 1,
      column: expect.any(Number),
      element: "joint 'turn'",
    })
  })

  it('reports the malformed numbers of a joint whose type is unknown too, so that no second reading is needed', () => {
    const joint = '<joint name="j" type="revolut"><parent link="a"/><child link="b"/><axis xyz="0 0,5 1"/><limit lower="a" upper="1" effort="1" velocity="0x1"/><mimic joint="k" offset="1,5"/></joint>'
    const { findings } = parse(robot(`<link name="a"/><link name="b"/>${joint}`))
    expect(findings.map(({ rule }) => rule)).toEqual(['joint-type-unknown', 'number-malformed', 'number-malformed', 'number-malformed', 'number-malformed'])
    expect(findings.map(({ message }) => message.split('=')[0])).toEqual(['type', 'xyz', 'lower', 'velocity', 'offset'])
  })
})
