'use client'

import { Fingerprint } from '@/components/ui/fingerprint'
import { StatusMark } from '@/components/ui/status-mark'
import { Timestamp } from '@/components/ui/timestamp'
import { TitleBlock, TitleCell } from '@/components/ui/title-block'
import { useUnits } from '@/components/ui/units-context'
import type { Revision } from '@/lib/contract/model'
import { actsOf } from './acts'

interface SheetTitleBlockProps {
  readonly revision: Pick<Revision, 'model' | 'revision' | 'status' | 'fingerprint' | 'importedBy' | 'importedAt' | 'history' | 'counts' | 'fileName' | 'provenance'>
  /** How many revisions the model has. */
  readonly total: number
}

/** The title block of a sheet. */
export function SheetTitleBlock({ revision, total }: SheetTitleBlockProps) {
  const { units } = useUnits()
  const { submitted, released } = actsOf(revision.history)
  return (
    <TitleBlock label="Title block">
      <TitleCell label="Model" span={6}>
        <bdi className="block text-left text-18 break-words">{revision.model.name}</bdi>
      </TitleCell>
      <TitleCell label="Fingerprint" span={4}>
        <Fingerprint value={revision.fingerprint} />
      </TitleCell>
      <TitleCell label="Status">
        <StatusMark status={revision.status} />
      </TitleCell>
      <TitleCell label="Revision">
        <span className="num">
          {revision.revision} of {total}
        </span>
      </TitleCell>
      <TitleCell label="Independent joints">
        <span className="num">{revision.counts.independent}</span>
      </TitleCell>
      <TitleCell label="Units">
        {units.angle} · {units.length}
      </TitleCell>
      <ProvenanceCells provenance={revision.provenance} />
      <TitleCell label="Imported by">
        <By by={revision.importedBy} at={revision.importedAt} />
      </TitleCell>
      <TitleCell label="Submitted by">{submitted === undefined ? <None /> : <By by={submitted.by} at={submitted.at} />}</TitleCell>
      <TitleCell label="Released by" className="max-tablet:col-span-6">{released === undefined ? <None /> : <By by={released.by} at={released.at} />}</TitleCell>
    </TitleBlock>
  )
}

/** What was said of where the file comes from; nothing takes no room. */
function ProvenanceCells({ provenance }: Pick<Revision, 'provenance'>) {
  if (provenance === undefined) return null
  const { serialNumber, geometry, supplierNote } = provenance
  return (
    <>
      <TitleCell label="Serial number" span={4}>
        {serialNumber === undefined ? <None /> : <bdi className="num block text-left break-words">{serialNumber}</bdi>}
      </TitleCell>
      <TitleCell label="Geometry">{geometry ?? <None />}</TitleCell>
      {supplierNote === undefined ? null : (
        <TitleCell label="Supplier's note" span={6}>
          <bdi className="block text-left font-normal break-words whitespace-pre-line">{supplierNote}</bdi>
        </TitleCell>
      )}
    </>
  )
}

function By({ by, at }: { readonly by: string; readonly at: string }) {
  return (
    <>
      <bdi className="block text-left break-words">{by}</bdi>
      <Timestamp at={at} dayOnly className="font-normal" />
    </>
  )
}

const None = () => <span className="font-normal text-soft">–</span>
