import { ArchiveRefused, shown } from './refuse-archive'

interface Candidate {
  readonly path: string
  readonly bytes: Uint8Array
}

const endsInUrdf = ({ path }: Candidate): boolean => /\.urdf$/i.test(path)

const LOOKED_AT = 64 * 1024
/** What may stand before the first element, by how it begins and ends. */
const BEFORE = [['<?', '?>'], ['<!--', '-->']] as const

/** Whether XML begins with a robot element, in any encoding that writes ASCII in one byte. */
function beginsWithRobot({ path, bytes }: Candidate): boolean {
  if (!/\.xml$/i.test(path)) return false
  let text = Buffer.from(bytes.subarray(0, LOOKED_AT)).toString('latin1').replace(/^\xef\xbb\xbf/, '').trimStart()
  for (;;) {
    const skipped = BEFORE.find(([begin]) => text.startsWith(begin))
    if (skipped === undefined) return /^<robot[\s>/]/.test(text)
    const end = text.indexOf(skipped[1], skipped[0].length)
    if (end === -1) return false
    text = text.slice(end + skipped[1].length).trimStart()
  }
}

/** Whether a file in an archive is a description: it ends in .urdf or, where none does, it is XML that begins with a robot. */
export const isDescription = (file: Candidate, all: readonly Candidate[]): boolean => endsInUrdf(file) || (!all.some(endsInUrdf) && beginsWithRobot(file))

const MOST_LISTED = 20
const listed = (paths: readonly string[]): string =>
  paths.slice(0, MOST_LISTED).map(shown).join(', ') + (paths.length > MOST_LISTED ? ` and ${paths.length - MOST_LISTED} more` : '')

/** The description to read. Fails with archive-without-urdf, archive-entry-missing or archive-several-urdfs. */
export function chooseDescription(descriptions: readonly string[], entry: string | undefined): string {
  if (descriptions.length === 0) throw new ArchiveRefused('archive-without-urdf', 'The archive holds no file that ends in .urdf.')
  if (entry !== undefined) {
    if (descriptions.includes(entry)) return entry
    throw new ArchiveRefused('archive-entry-missing', `The archive has no description ${shown(entry)}. It has ${listed(descriptions)}.`)
  }
  if (descriptions.length === 1) return descriptions[0]!
  throw new ArchiveRefused('archive-several-urdfs', `The archive has ${descriptions.length} descriptions: ${listed(descriptions)}. Choose one.`)
}
