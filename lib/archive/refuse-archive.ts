import type { Finding } from '@/lib/urdf/description'
import { createReport } from '@/lib/urdf/report'
import type { ARCHIVE_RULES } from '@/lib/urdf/rules-of-archive'

export type ArchiveRule = keyof typeof ARCHIVE_RULES

/** Why an archive is refused. Thrown within lib/archive and caught by openArchive, its only way out. */
export class ArchiveRefused extends Error {
  constructor(
    readonly rule: ArchiveRule,
    message: string,
    /** The entry that it is about. */
    readonly path?: string,
  ) {
    super(message)
  }
}

const LONGEST = 200

/** A path in a message: shortened, and without what would not be seen. */
export const shown = (path: string): string => {
  const visible = path.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, (character) => `\\u{${character.codePointAt(0)!.toString(16)}}`)
  return `"${visible.length > LONGEST ? `${visible.slice(0, LONGEST)}…` : visible}"`
}

/** A finding about an archive: it has no lines, so its place is the beginning. */
export function archiveFinding(rule: ArchiveRule, message: string, path?: string): Finding {
  const report = createReport('')
  report.add(rule, 0, message, path === undefined ? {} : { element: `entry ${shown(path)}` })
  return report.findings()[0]!
}
