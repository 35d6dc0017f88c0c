import type { Metadata } from 'next'
import { EvidencePanel } from '@/components/evidence/evidence-panel'
import { revisionHref } from '@/components/import/revision-href'
import { Main } from '@/components/shell/main'
import { ChainChooser } from '@/components/sheet/chain-chooser'
import { ChainJoints } from '@/components/sheet/chain-joints'
import { DrawingPanel } from '@/components/sheet/drawing-panel'
import { FindingsSummary } from '@/components/sheet/findings-summary'
import { HistoryList } from '@/components/sheet/history-list'
import { InForceNotice } from '@/components/sheet/in-force-notice'
import { rowsOfChain } from '@/components/sheet/joint-rows'
import { MeshesPanel } from '@/components/sheet/meshes-panel'
import { NoDrawing } from '@/components/sheet/no-drawing'
import { PrintStyle } from '@/components/sheet/print-style'
import { RequestPanel } from '@/components/sheet/request-panel'
import { RevisionTable } from '@/components/sheet/revision-table'
import { SheetFrame } from '@/components/sheet/sheet-frame'
import { SheetHead } from '@/components/sheet/sheet-head'
import { SheetTitleBlock } from '@/components/sheet/sheet-title-block'
import { SourcePanel } from '@/components/sheet/source-panel'
import { StructurePanel } from '@/components/sheet/structure-panel'
import { UsedByPanel } from '@/components/sheet/used-by-panel'
import { may } from '@/lib/access/permissions'
import { getFindings } from '@/lib/catalog/get-findings'
import { getModel } from '@/lib/catalog/get-model'
import { getRevision } from '@/lib/catalog/get-revision'
import { listRevisions } from '@/lib/catalog/list-revisions'
import { listUses } from '@/lib/catalog/list-uses'
import { listReferencePoses } from '@/lib/compute/list-reference-poses'
import type { ReferencePosesSummary } from '@/lib/contract/reference-poses'
import { siteUrl } from '@/lib/env'
import { visit } from '@/lib/http/visit'
import { reading } from '../../../../../reading'
import { drawnChain } from './drawn-chain'
import { evidenceRefusal, fourEyesRefusal, possibleTransitions } from './possible-transitions'

interface SheetPageProps {
  readonly params: Promise<{ team: string; model: string; revision: string }>
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>
}

export async function generateMetadata({ params }: SheetPageProps): Promise<Metadata> {
  const { at } = await visit('getRevision', await params)
  return { title: `${at.model.model.name}, revision ${at.revision.number}` }
}

const MOST_REVISIONS = 200
const MOST_SETS = 5
const MOST_USES = 8

const one = (value: string | string[] | undefined): string | undefined => (typeof value === 'string' && value !== '' ? value : undefined)

export default async function SheetPage({ params, searchParams }: SheetPageProps) {
  const { caller, at } = await visit('getRevision', await params)
  const asked = await searchParams
  const [{ body: revision }, { body: model }, { body: revisions }, { body: findings }, { body: poses }, { body: uses }, drawn] = await Promise.all([
    getRevision(caller, reading(at)),
    getModel(caller, reading(at)),
    listRevisions(caller, reading(at, { limit: MOST_REVISIONS })),
    getFindings(caller, reading(at)),
    listReferencePoses(caller, reading(at, { limit: MOST_SETS })),
    listUses(caller, reading(at, { limit: MOST_USES })),
    drawnChain(caller, at, { base: one(asked.base), tip: one(asked.tip) }),
  ])
  const { slug: team } = caller.team
  const href = (number: number) => revisionHref(team, model.slug, number)
  const path = { team, model: model.slug, revision: revision.revision }
  const { chain, resting } = drawn
  const values = resting ?? chain?.joints.map(() => 0) ?? []

  return (
    <Main>
      <PrintStyle />
      <SheetHead
        path={path}
        model={model}
        revision={revision}
        possible={possibleTransitions(caller, revision.status)}
        barred={evidenceRefusal(caller, poses.items[0]) ?? fourEyesRefusal(caller, at.revision.importedBy, revision.history)}
        mayImport={may(caller, 'createRevision')}
      />
      <InForceNotice status={revision.status} revision={revision.revision} released={model.released} href={href} />
      <SheetFrame
        drawing={
          chain === null || resting === null ? (
            <NoDrawing reason={drawn.refusal} joints={chain?.joints.length ?? 0} />
          ) : (
            <DrawingPanel chain={chain} resting={resting} name={model.name} />
          )
        }
        titleBlock={<SheetTitleBlock revision={revision} total={model.revisions} />}
      >
        {chain === null ? null : <ChainJoints rows={rowsOfChain(chain.joints, findings.items)} resting={values} />}
        <FindingsSummary findings={findings.items} counts={revision.findings} sourceHref={`${href(revision.revision)}/source`} />
        <RevisionTable team={team} revisions={revisions.items} current={revision.revision} total={model.revisions} />
      </SheetFrame>
      <div className="mt-8 grid grid-cols-[minmax(0,1fr)] items-start gap-x-10 gap-y-8 desk:grid-cols-[repeat(2,minmax(0,1fr))]">
        <HistoryList history={revision.history} />
        <EvidencePanel
          path={path}
          sets={poses.items as ReferencePosesSummary[]}
          hasMore={poses.nextCursor !== undefined}
          mayAdd={may(caller, 'addReferencePoses')}
          wasReleased={revision.history.some(({ status }) => status === 'released')}
          isRequired={caller.team.evidenceRequired}
        />
        <ChainChooser
          href={href(revision.revision)}
          chains={revision.chains}
          links={revision.links}
          base={chain?.base ?? revision.rootLink}
          tip={chain?.tip ?? ''}
          refusal={drawn.refusal}
        />
        {chain === null ? null : (
          <RequestPanel
            joints={chain.joints}
            chain={drawn.isDefault ? undefined : { base: chain.base, tip: chain.tip }}
            resting={values}
            site={siteUrl()}
            path={`/teams/${team}/models/${model.slug}/revisions/${revision.revision}`}
            fingerprint={revision.fingerprint}
          />
        )}
        <UsedByPanel uses={uses.items} hasMore={uses.nextCursor !== undefined} />
        <SourcePanel path={path} fileName={revision.fileName} entry={revision.archive?.entry} sourceDigest={revision.sourceDigest} fingerprint={revision.fingerprint} />
        {revision.meshes === undefined ? null : <MeshesPanel path={path} meshes={revision.meshes} />}
      </div>
      <StructurePanel rootLink={revision.rootLink} joints={revision.joints} counts={revision.counts} robotName={revision.robotName} />
    </Main>
  )
}
