import type { RevisionRow } from '@/db/queries/revisions'
import type { Provenance } from '@/lib/contract/provenance'

/** Where a revision's file comes from, as it was said; undefined where nothing was. */
export function presentProvenance({ serialNumber, geometry, supplierNote }: Pick<RevisionRow, 'serialNumber' | 'geometry' | 'supplierNote'>): Provenance | undefined {
  const said = { ...(serialNumber && { serialNumber }), ...(geometry && { geometry }), ...(supplierNote && { supplierNote }) }
  return Object.keys(said).length === 0 ? undefined : said
}
