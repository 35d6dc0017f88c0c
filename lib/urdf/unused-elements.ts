import { KNOWN_ELEMENTS } from '@/lib/urdf/known-elements'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf } from '@/lib/urdf/read-value'
import type { Report } from '@/lib/urdf/report'
import { quoted } from '@/lib/urdf/wording'

/** By these words vendors call the elements that close a loop, which URDF has no element for. */
const CLOSES_A_LOOP = /loop|closure|constraint/i

/** Collects the elements of a file that nothing reads, one note for each name and place of it. */
export interface UnusedElements {
  /** The children of an element that URDF knows in it. The others are noted; `within` is the name under which KNOWN_ELEMENTS has it. */
  knownChildren(within: string, element: XmlElement, label?: string): readonly XmlElement[]
  /** Reports what was met. */
  finish(): void
}

interface Met {
  readonly at: number
  readonly name: string
  readonly within: string
  readonly label: string | undefined
  count: number
}

/** A collector for one file. */
export function createUnusedElements(text: string, report: Report): UnusedElements {
  const met = new Map<string, Met>()
  const note = (within: string, { name, at }: XmlElement, label: string | undefined): void => {
    const key = `${within}/${name}`
    const known = met.get(key)
    if (known) known.count++
    else met.set(key, { at, name, within, label, count: 1 })
  }
  const closesLoop = (element: XmlElement): void => {
    const name = attributesOf(text, element).get('name')
    const which = name ? ` ${quoted(name.value)}` : ''
    report.add('closed-loop-ignored', element.at, `<${element.name.slice(0, 80)}>${which} closes a loop in a way of its vendor's own, and is ignored: the loop stays open.`)
  }
  return {
    knownChildren(within, element, label) {
      const known = KNOWN_ELEMENTS[within] ?? []
      return element.children.filter((child) => {
        if (known.includes(child.name)) return true
        if (child.name.startsWith('xacro:')) return false
        if (within === 'robot' && CLOSES_A_LOOP.test(child.name)) closesLoop(child)
        else note(within, child, label)
        return false
      })
    },
    finish() {
      for (const { at, name, within, label, count } of met.values()) {
        const times = count === 1 ? 'stands' : `stands ${count} times`
        const place = within === 'robot' ? 'directly inside <robot>' : `inside <${within}>`
        report.add('unknown-element', at, `<${name.slice(0, 80)}> ${times} ${place}: it is kept in the file and not used.`, label === undefined ? {} : { element: label })
      }
    },
  }
}
