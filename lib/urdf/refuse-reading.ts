import type { Finding } from '@/lib/urdf/description'
import { createReport } from '@/lib/urdf/report'

/** The one finding of a file whose reading was given up. why: as a clause without a full stop. */
export function refuseReading(why: string): Finding[] {
  const report = createReport('')
  report.add('reading-given-up', 0, `The file was not read to its end: ${why}.`)
  return report.findings()
}
