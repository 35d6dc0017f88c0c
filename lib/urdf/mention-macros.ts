import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf, waitsForXacro } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { quoted } from '@/lib/urdf/wording'

/** Warns of macros in elements where nothing that enters the computation is missing for them. */
export function mentionMacros(reading: Reading, elements: readonly XmlElement[], label: string): void {
  const { text, report, hasMacros } = reading
  if (!hasMacros) return
  for (const part of elements) {
    if (part.name.startsWith('xacro:')) {
      report.add('xacro-leftover', part.at, `<${part.name.slice(0, 80)}> still waits for xacro to be expanded; nothing that is computed depends on it.`, { element: label })
      continue
    }
    for (const { name, value, valueAt } of attributesOf(text, part).values()) {
      if (!waitsForXacro(value)) continue
      report.add('xacro-leftover', valueAt, `${name}=${quoted(value)} still waits for xacro to put in a value; nothing that is computed depends on it.`, { element: label })
    }
    mentionMacros(reading, part.children, label)
  }
}
