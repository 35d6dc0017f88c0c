import type { DraftLink } from '@/lib/urdf/read-link'
import { waitsForXacro } from '@/lib/urdf/read-value'
import type { Report } from '@/lib/urdf/report'
import { leadsOutside, meshResolver } from '@/lib/urdf/resolve-mesh'
import { quoted } from '@/lib/urdf/wording'

/** Reports the meshes that are not to be had, each file at its first use: those that lead out of the upload, and those that it does
 *  not have. files: the paths in the upload; null when it is a single file, of which one finding says that it has none. */
export function checkMeshes(report: Report, links: readonly DraftLink[], files: readonly string[] | null): void {
  const seen = new Set<string>()
  const resolve = files === null ? null : meshResolver(files)
  const missing = links.flatMap(({ label, meshes }) =>
    meshes.flatMap(({ value, valueAt }) => {
      if (seen.has(value) || waitsForXacro(value)) return []
      seen.add(value)
      if (leadsOutside(value)) {
        report.add('mesh-outside', valueAt, `The mesh ${quoted(value)} lies outside the upload; its path is never followed, and the shape is not shown.`, { element: label })
        return []
      }
      return resolve !== null && resolve(value) !== null ? [] : [{ label, value, valueAt }]
    }),
  )
  if (files !== null) {
    for (const { label, value, valueAt } of missing) {
      report.add('mesh-missing', valueAt, `The mesh ${quoted(value)} is not in the upload; the shape is not shown.`, { element: label })
    }
  } else if (missing.length > 0) {
    const [{ label, value, valueAt }] = missing as [(typeof missing)[0]]
    const which = missing.length === 1 ? `the mesh ${quoted(value)}, which is` : `${missing.length} meshes, first ${quoted(value)}, which are`
    report.add('mesh-missing', valueAt, `The file refers to ${which} not in the upload: it is a single file. The shapes are not shown.`, { element: label })
  }
}
