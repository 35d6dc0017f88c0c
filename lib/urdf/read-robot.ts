import { checkMeshes } from '@/lib/urdf/check-meshes'
import { checkMimics } from '@/lib/urdf/check-mimics'
import { checkNames } from '@/lib/urdf/check-names'
import { checkTree } from '@/lib/urdf/check-tree'
import { checkUnits } from '@/lib/urdf/check-units'
import type { Description } from '@/lib/urdf/description'
import { describeJoint, readJoint } from '@/lib/urdf/read-joint'
import { readLink } from '@/lib/urdf/read-link'
import { checkMaterial } from '@/lib/urdf/read-shape'
import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf, isUnexpanded, waitsForXacro } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import type { Report } from '@/lib/urdf/report'
import { checkName } from '@/lib/urdf/scan-xml'
import { createUnusedElements } from '@/lib/urdf/unused-elements'
import { quoted } from '@/lib/urdf/wording'

/** What xacro reads and leaves nothing of; everything else of it stands for links, joints or values that are missing. */
const XACRO_DEFINITIONS = ['xacro:arg', 'xacro:macro', 'xacro:property']

/** The description in an XML tree, or null where an error is reported. Only direct children of the robot element count as
 *  links and joints: those inside other elements belong to simulators and drives. files: the paths in the upload, to look for
 *  meshes in; null when it is a single file. */
export function readRobot(text: string, root: XmlElement, report: Report, files: readonly string[] | null): Description | null {
  if (root.name !== 'robot') {
    const sdf = root.name === 'sdf' ? ' This is SDF, a format for simulated worlds.' : ''
    report.add('not-urdf', root.at, `The outermost element is <${root.name.slice(0, 80)}>, not <robot>.${sdf}`)
    return null
  }
  const attributes = attributesOf(text, root)
  const robotName = attributes.get('name')
  if (robotName) {
    checkName(report, robotName.value, robotName.valueAt, 'the robot')
    isUnexpanded(report, robotName, 'robot')
  }
  if (!robotName || robotName.value.trim() === '') {
    report.add('robot-unnamed', robotName?.valueAt ?? root.at, `The robot has ${robotName ? 'an empty' : 'no'} name.`)
  }
  const unused = createUnusedElements(text, report)
  const reading: Reading = { text, report, version: readVersion(report, attributes.get('version')), unused, hasMacros: waitsForXacro(text) || text.includes('<xacro:') }
  for (const { name, at } of root.children) {
    if (!name.startsWith('xacro:')) continue
    if (XACRO_DEFINITIONS.includes(name)) report.add('xacro-leftover', at, `<${name}> only defines something, and is ignored.`)
    else report.add('xacro-unexpanded', at, `<${name.slice(0, 80)}> still waits for xacro to be expanded.`)
  }
  const children = unused.knownChildren('robot', root)
  const links = children.filter(({ name }) => name === 'link').map((element) => readLink(reading, element))
  const joints = children.filter(({ name }) => name === 'joint').map((element) => readJoint(reading, element))
  for (const child of children) if (child.name === 'material') checkMaterial(reading, child)
  const linksByName = byName(report, links, 'duplicate-link')
  const jointsByName = byName(report, joints, 'duplicate-joint')
  if (links.length === 0) report.add('no-links', root.at, 'No <link> stands directly inside <robot>.')
  checkTree(report, linksByName, joints)
  checkMimics(report, jointsByName)
  checkUnits(report, joints)
  checkNames(report, [...links, ...joints])
  checkMeshes(report, links, files)
  unused.finish()
  if (report.hasErrors()) return null

  const held = new Set(joints.map(({ child }) => child!.value))
  return {
    version: reading.version,
    robotName: robotName?.value ?? '',
    root: links.find(({ name }) => !held.has(name!.value))!.name!.value,
    links: links.map(({ name, meshes }) => ({ name: name!.value, meshes: meshes.map(({ value }) => value) })),
    joints: joints.map(describeJoint),
  }
}

function readVersion(report: Report, version: Attribute | undefined): Description['version'] {
  const value = version?.value ?? '1.0'
  if (value === '1.0' || value === '1.1' || value === '1.2') return value
  report.add('version-unknown', version!.valueAt, `version=${quoted(value)} is none of 1.0, 1.1 and 1.2; the file is read as 1.0.`)
  return '1.0'
}

/** The first element of each name; further ones are reported. */
function byName<T extends { readonly name: Attribute | null; readonly at: number; readonly label: string }>(
  report: Report, elements: readonly T[], rule: 'duplicate-link' | 'duplicate-joint',
): Map<string, T> {
  const found = new Map<string, T>()
  for (const element of elements) {
    if (!element.name) continue
    const first = found.get(element.name.value)
    if (!first) found.set(element.name.value, element)
    else report.add(rule, element.name.valueAt, `The name ${quoted(element.name.value)} is taken since line ${report.lineAt(first.at)}.`, { element: element.label })
  }
  return found
}
