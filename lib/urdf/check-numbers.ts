import { LARGEST, numbersOf, type ReadElement } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'

const LIMITS = ['lower', 'upper', 'velocity', 'effort', 'acceleration', 'deceleration', 'jerk'] as const

/** Numbers of a joint that only its type gives a meaning to: element, attribute, how many, and the largest. */
const NUMBERS: readonly (readonly [part: string, name: string, count: number, largest: number])[] = [
  ['axis', 'xyz', 3, LARGEST.geometry],
  ...LIMITS.map((name) => ['limit', name, 1, LARGEST.limit] as const),
  ['mimic', 'multiplier', 1, LARGEST.geometry],
  ['mimic', 'offset', 1, LARGEST.geometry],
]

/** Reports the malformed numbers of a joint whose type is not known, so that they need no second reading once the type is mended. */
export function checkNumbers({ report }: Reading, parts: ReadonlyMap<string, ReadElement>, label: string): void {
  for (const [part, name, count, largest] of NUMBERS) {
    const written = parts.get(part)?.attributes.get(name)
    if (written) numbersOf(report, written, count, largest, label)
  }
}
