import type { Db } from '@/db/client'
import { listMeshRows } from '@/db/queries/meshes'
import type { ModelRow } from '@/db/queries/models'
import { getDescription, getFindingRows, listTransitions, type RevisionRow, type TransitionRow } from '@/db/queries/revisions'
import type { Revision, RevisionSummary } from '@/lib/contract/model'
import type { Finding } from '@/lib/urdf/description'
import { presentMeshes } from './present-meshes'
import { presentProvenance } from './present-provenance'
import { presentStructure } from './present-structure'

const countBySeverity = (findings: readonly Finding[]) => {
  const counts = { error: 0, warning: 0, note: 0 }
  for (const { severity } of findings) counts[severity]++
  return counts
}

const presentHistory = (rows: readonly TransitionRow[]): Revision['history'] =>
  rows.map((row) => ({
    status: row.status,
    by: row.byName,
    at: row.at.toISOString(),
    ...(row.comment === null ? {} : { comment: row.comment }),
  }))

function summaryFields(model: ModelRow['model'], row: RevisionRow, findings: readonly Finding[], history: readonly TransitionRow[]) {
  const provenance = presentProvenance(row)
  return {
    model: { slug: model.slug, name: model.name },
    revision: row.number,
    status: row.status,
    importedBy: row.importedByKey ?? row.importedByName ?? '',
    importedAt: row.importedAt.toISOString(),
    fileName: row.fileName,
    ...(row.note === null ? {} : { note: row.note }),
    ...(provenance && { provenance }),
    history: presentHistory(history),
    findings: countBySeverity(findings),
  }
}

/** A revision of a list, as the contract shows it. */
export const presentSummary = (
  model: ModelRow['model'],
  row: RevisionRow & { findings: readonly Finding[] },
  history: readonly TransitionRow[],
): RevisionSummary => ({
  ...summaryFields(model, row, row.findings, history),
  robotName: row.robotName,
  fingerprint: row.fingerprint,
  sourceDigest: row.sourceDigest,
  independent: row.independent,
})

/** A whole revision as the contract shows it, read afresh. */
export async function presentRevision(db: Db, model: ModelRow['model'], row: RevisionRow): Promise<Revision> {
  const [description, findings, transitions, files] = await Promise.all([
    getDescription(db, row.id),
    getFindingRows(db, row.id),
    listTransitions(db, [row.id]),
    row.entry === null ? [] : listMeshRows(db, row.id),
  ])
  return {
    ...summaryFields(model, row, findings, transitions.get(row.id) ?? []), ...presentStructure(description, row),
    ...presentMeshes(description, files),
    ...(row.entry === null ? {} : { archive: { entry: row.entry, files: files.map(({ path, size, digest, mediaType }) => ({ path, size, digest, mediaType })) } }),
  }
}
