import { XMLParser } from 'fast-xml-parser'
import type { ScannedXml } from '@/lib/urdf/scan-xml'

/** An element with the offset of its `<`. Its attributes are read from the text when they are asked for (read-tag.ts). */
export interface XmlElement {
  readonly name: string
  readonly at: number
  readonly children: readonly XmlElement[]
}

/** The library builds the nesting and nothing else: it has its own ideas about attributes, entities, quotes in processing
 *  instructions and reserved names, so it is shown bare tags. The mark before element names keeps them apart from the property
 *  names of JavaScript (an element may be called `constructor`). */
const MARK = '<'
const parser = new XMLParser({
  preserveOrder: true,
  ignoreAttributes: true,
  parseTagValue: false,
  processEntities: false,
  maxNestedTags: 1000,
  transformTagName: (name: string) => (name.startsWith(MARK) ? name : MARK + name),
})

type Node = Readonly<Record<string, unknown>>

/** The tree of a text that `scanXml` has passed: its outermost element. Recursion is bounded by XML_LIMITS.depth.
 *  Throws when the two readers count differently, which would be a fault of ours. */
export function readTree({ tags, starts }: ScannedXml): XmlElement {
  let count = 0
  const read = (nodes: readonly Node[]): XmlElement[] =>
    nodes.map((node) => {
      const key = Object.keys(node)[0]!
      return { name: key.slice(MARK.length), at: starts[count++]!, children: read(node[key] as Node[]) }
    })
  const [root] = read(parser.parse(tags) as Node[])
  if (!root || count !== starts.length) throw new Error(`The two readings of a file differ: ${count} and ${starts.length} elements`)
  return root
}
