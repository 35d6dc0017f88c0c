import type { Tag } from '@/lib/urdf/read-tag'
import type { Report } from '@/lib/urdf/report'
import { quoted } from '@/lib/urdf/wording'

const DECLARES = 'xmlns:'

/** Watches, tag by tag, whether prefixes of names are declared where they are used (Namespaces in XML 1.0, W3C 2009). */
export interface Namespaces {
  /** at: offset of the tag. */
  enter(tag: Tag, at: number): void
  leave(): void
}

/** A watch over one file, which reports each prefix once. */
export function createNamespaces(report: Report): Namespaces {
  const declared = new Map<string, number>([['xml', 1], ['xmlns', 1]])
  const reported = new Set<string>()
  const levels: (readonly string[] | null)[] = []
  const count = (prefix: string, by: number): void => void declared.set(prefix, (declared.get(prefix) ?? 0) + by)
  const check = (name: string, at: number): void => {
    const prefix = name.slice(0, Math.max(0, name.indexOf(':')))
    if (prefix === '' || reported.has(prefix) || (declared.get(prefix) ?? 0) > 0) return
    reported.add(prefix)
    report.add('namespace-undeclared', at, `The prefix ${quoted(prefix)} is used, and no xmlns:${prefix.slice(0, 80)} declares it.`)
  }
  return {
    enter({ name, attributes }, at) {
      if (!name.includes(':') && !attributes.some((attribute) => attribute.name.includes(':'))) return void levels.push(null)
      const prefixes = attributes.flatMap((attribute) => (attribute.name.startsWith(DECLARES) ? [attribute.name.slice(DECLARES.length)] : []))
      for (const prefix of prefixes) count(prefix, 1)
      levels.push(prefixes.length === 0 ? null : prefixes)
      check(name, at)
      for (const attribute of attributes) check(attribute.name, attribute.nameAt)
    },
    leave() {
      for (const prefix of levels.pop() ?? []) count(prefix, -1)
    },
  }
}
