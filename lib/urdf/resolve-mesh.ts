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
export function resolveMesh(filename: string, files: readonly string[]): string | null {
  if (leadsOutside(filename)) return null
  const isPackage = filename.trim().startsWith(PACKAGE)
  const wanted = partsOf(isPackage ? filename.trim().slice(PACKAGE.length) : filename)
  const enough = Math.max(1, wanted.length - (isPackage ? 1 : 0))
  let best: { file: string; common: number; length: number } | null = null
  for (const file of files) {
    const parts = partsOf(file)
    let common = 0
    while (common < Math.min(parts.length, wanted.length) && parts.at(-1 - common) === wanted.at(-1 - common)) common++
    if (common < enough && (common === 0 || common < parts.length)) continue
    const isBetter = !best || common > best.common || (common === best.common && (parts.length < best.length || (parts.length === best.length && file < best.file)))
    if (isBetter) best = { file, common, length: parts.length }
  }
  return best?.file ?? null
}

const partsOf = (path: string): string[] => path.split(/[/\\]/).filter((part) => part !== '' && part !== '.')
