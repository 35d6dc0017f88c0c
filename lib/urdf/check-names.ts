import type { Attribute } from '@/lib/urdf/read-tag'
import type { Report } from '@/lib/urdf/report'
import { listed } from '@/lib/urdf/wording'

/** What every program that reads URDF takes in a name (common practice). */
const USUAL = /^[A-Za-z0-9_-]+$/

/** Notes, once for the file, the names of links and joints with characters that some other program will not take. */
export function checkNames(report: Report, elements: readonly { readonly name: Attribute | null; readonly label: string }[]): void {
  const unusual = elements.filter(({ name }) => name !== null && !USUAL.test(name.value)).sort((a, b) => a.name!.nameAt - b.name!.nameAt)
  const [first] = unusual
  if (first === undefined) return
  const names = [...new Set(unusual.map(({ name }) => name!.value))]
  const what = names.length === 1 ? `The name ${listed(names)} has` : `The names ${listed(names)} have`
  report.add('name-unusual', first.name!.valueAt, `${what} other characters than letters A to Z, digits, '_' and '-'.`, { element: first.label })
}
