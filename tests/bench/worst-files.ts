/** The files of (nearly) the largest size that cost a reader most, each by another part of it. */

/** Nearly all that is read of a file, with room for what stands around the filling. */
const LARGE = 8 * 1024 * 1024 - 1024
const fill = (piece: string, length = LARGE): string => piece.repeat(Math.floor(length / piece.length))
const times = (count: number, piece: (i: number) => string): string => Array.from({ length: count }, (_, i) => piece(i)).join('')
const inRobot = (body: string): string => `<robot name="r">${body}</robot>`

const PLACE = '<origin xyz="0.1 0.2 0.3" rpy="0.1 0.2 0.3"/><axis xyz="0 0 1"/><limit lower="-1" upper="1" effort="5" velocity="2"/>'
const chain = (count: number, type: string, body: string): string =>
  inRobot(
    times(count, (i) => `<link name="l${i}"/>`) +
      times(count - 1, (i) => `<joint name="j${i}" type="${type}"><parent link="l${i}"/><child link="l${i + 1}"/>${body}</joint>`),
  )
const ATTRIBUTES = times(60, (i) => ` a${i}=""`)

export const WORST_FILES: Readonly<Record<string, () => string>> = {
  'blanks between elements': () => inRobot(fill(' ')),
  'empty lines': () => inRobot(fill('\n')),
  comments: () => inRobot(fill('<!---->')),
  'references in text': () => inRobot(fill('&amp;')),
  'references in a value': () => `<robot name="${fill('&amp;')}"/>`,
  'a name of 4 million characters': () => inRobot(`<link name="${fill('ä')}"/>`.slice(0, 4_190_000) + '"/>'),
  'numbers in a vector': () => inRobot(`<link name="a"/><link name="b"/><joint name="j" type="fixed"><parent link="a"/><child link="b"/><origin xyz="${fill('1 ')}"/></joint>`),
  '200 000 elements': () => inRobot(`<link name="a"/>${'<a/>'.repeat(199_990)}`),
  '20 000 tags of 60 attributes': () => inRobot(fill(`<a${ATTRIBUTES}/>`)),
  '200 000 joints that are empty': () => inRobot(fill('<joint/>', 8 * 199_990)),
  '190 000 links that nothing joins': () => inRobot(times(190_000, (i) => `<link name="${i}"/>`)),
  '49 000 joints without a limit': () => chain(49_000, 'revolute', ''),
  'a chain of 49 000 fixed joints': () => chain(49_000, 'fixed', ''),
  'a chain of 28 000 revolute joints': () => chain(28_000, 'revolute', PLACE),
  '28 000 revolute joints, all wrong': () => chain(28_000, 'revolute', PLACE.replaceAll(/"[^"]*"/g, '"x"')),
  '33 000 joints in a circle of mimics': () =>
    inRobot(times(33_000, (i) => `<link name="${i}"/><joint name="${i}" type="prismatic"><parent link="0"/><child link="${i}"/><limit/><mimic joint="${(i + 1) % 33_000}"/></joint>`)),
  '40 000 meshes': () => inRobot(times(40_000, (i) => `<link name="${i}"><visual><geometry><mesh filename="${i}.stl"/></geometry></visual></link>`)),
}
