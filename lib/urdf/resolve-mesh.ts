const PACKAGE = 'package://'

/** Whether the filename of a mesh leads out of the upload: an absolute path of any system, a scheme other than package:, or a way up. */
export function leadsOutside(filename: string): boolean {
  const path = filename.trim()
  const inside = path.startsWith(PACKAGE) ? path.slice(PACKAGE.length) : path
  return /^[/\\]|^[A-Za-z][A-Za-z0-9+.-]*:/.test(inside) || inside.split(/[/\\]/).includes('..')
}

/** The path in an upload that the filename of a mesh means, or null. `package://name/path` and relative paths resolve to the file with
 *  the longest common end, where the shorter of the two paths is wholly the end of the other; of several, the shortest, then the first
 *  by name. A filename that leads outside resolves to nothing. */
export const resolveMesh = (filename: string, files: readonly string[]): string | null => meshResolver(files)(filename)

interface Candidate {
  readonly file: string
  readonly parts: readonly string[]
}

/** resolveMesh for many meshes in the same files, which are sorted by their last part once. */
export function meshResolver(files: readonly string[]): (filename: string) => string | null {
  const byLastPart = new Map<string, Candidate[]>()
  for (const file of files) {
    const parts = partsOf(file)
    const last = parts.at(-1) ?? ''
    const known = byLastPart.get(last)
    if (known === undefined) byLastPart.set(last, [{ file, parts }])
    else known.push({ file, parts })
  }
  return (filename) => {
    if (leadsOutside(filename)) return null
    const isPackage = filename.trim().startsWith(PACKAGE)
    const wanted = partsOf(isPackage ? filename.trim().slice(PACKAGE.length) : filename)
    return longestCommon(byLastPart.get(wanted.at(-1) ?? '') ?? [], wanted, Math.max(1, wanted.length - (isPackage ? 1 : 0)))
  }
}

/** enough: with so many parts in common a file fits, though it stands deeper than is written. */
function longestCommon(candidates: readonly Candidate[], wanted: readonly string[], enough: number): string | null {
  let best: { file: string; common: number; length: number } | null = null
  for (const { file, parts } of candidates) {
    let common = 0
    while (common < Math.min(parts.length, wanted.length) && parts.at(-1 - common) === wanted.at(-1 - common)) common++
    if (common < enough && (common === 0 || common < parts.length)) continue
    const isBetter = !best || common > best.common || (common === best.common && (parts.length < best.length || (parts.length === best.length && file < best.file)))
    if (isBetter) best = { file, common, length: parts.length }
  }
  return best?.file ?? null
}

const partsOf = (path: string): string[] => path.split(/[/\\]/).filter((part) => part !== '' && part !== '.')
