const robot = (name: string, links: readonly string[], inside: string, joints: readonly string[]) =>
  `<?xml version="1.0" encoding="UTF-8"?>\n<robot name="${name}" version="1.0">\n${links.map((link) => `  <link name="${link}">${inside}</link>`).join('\n')}\n${joints.join('\n')}\n</robot>\n`

const joint = (name: string, parent: string, child: string, axis = '0 0 1') =>
  `  <joint name="${name}" type="revolute"><parent link="${parent}"/><child link="${child}"/><origin xyz="0 0 0.1"/><axis xyz="${axis}"/><limit lower="-1.5" upper="1.5" effort="1" velocity="1"/></joint>`

const serial = (name: string, links: readonly string[], joints: readonly string[], inside = '', axis?: string) =>
  robot(name, links, inside, joints.map((one, i) => joint(one, links[i]!, links[i + 1]!, axis)))

/** A name of 256 characters without a place to break it. */
const long = (start: string) => start + 'x'.repeat(256 - start.length)

/** Every name has 256 characters. */
export const LONG_NAMES = serial(long('robot_'), [long('base_'), long('link_1_'), long('link_2_'), long('tool_')], [long('joint_1_'), long('joint_2_'), long('joint_3_')])

/** 130 links in one chain of 129 joints. */
export const MANY_LINKS = serial('centipede', Array.from({ length: 130 }, (_, i) => `link_${i}`), Array.from({ length: 129 }, (_, i) => `joint_${i + 1}`))

/** 3 000 findings in a file that can be stored all the same: as many joints, each with an axis to be normalised. */
export const MANY_FINDINGS = serial('talkative', Array.from({ length: 3001 }, (_, i) => `link_${i}`), Array.from({ length: 3000 }, (_, i) => `joint_${i + 1}`), '', '0 0 2')

/** Names written from right to left, with figures, points, a zero-width joiner, an override of the direction, and pictures. */
export const RIGHT_TO_LEFT = serial(
  'ذراع ٧',
  ['قاعدة', 'كتف-1 (left)', 'מרפק_2', 'שו\u200dרש 🦾', 'end\u202etool'],
  ['المفصل الأول', 'ציר 2', 'מפרק_3 [deg]', '\u200bפרק \u2067🦿'],
)

/** Names that the models get. */
export const LONG_NAME = 'Ha'.repeat(60)
export const ARABIC_NAME = 'ذراع الورشة (7) – שבע 🤖\u200b end'
