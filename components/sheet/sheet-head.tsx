import { comparisonHref } from '@/components/comparison/comparison-href'
import { PageHead } from '@/components/shell/page-head'
import { ButtonLink } from '@/components/ui/button-link'
import { StatusMark } from '@/components/ui/status-mark'
import type { Model, Revision } from '@/lib/contract/model'
import { PrintButton } from './print-button'
import { RevisionActions } from './revision-actions'
import type { TransitionTo } from './transition-looks'

interface SheetHeadProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  readonly model: Model
  readonly revision: Pick<Revision, 'revision' | 'status'>
  readonly possible: readonly TransitionTo[]
  /** Why a release by this person will be refused. */
  readonly barred: string | undefined
  readonly mayImport: boolean
}

/** A revision is held against the one in force, from the earlier to the later; the one in force against its neighbour. */
function comparedWith({ released, revisions }: Model, revision: number): [from: number, to: number] {
  const other = released === undefined || released === revision ? (revision > 1 ? revision - 1 : Math.min(revisions, 2)) : released
  return [Math.min(other, revision), Math.max(other, revision)]
}

/** Name, status and note of a revision, and what this person can do with it. */
export function SheetHead({ path, model, revision, possible, barred, mayImport }: SheetHeadProps) {
  const { team } = path
  const isBarred = possible.includes('released') && barred !== undefined
  return (
    <>
      <PageHead
        title={model.name}
        crumbs={[
          { label: 'Register', href: `/teams/${team}/models` },
          { label: model.name, href: `/teams/${team}/models/${model.slug}` },
          { label: `Revision ${revision.revision}` },
        ]}
        status={<StatusMark status={revision.status} />}
        detail={model.note}
        actions={
          <>
            <PrintButton />
            {model.revisions > 1 ? <ButtonLink href={comparisonHref(team, model.slug, ...comparedWith(model, revision.revision))}>Compare</ButtonLink> : null}
            {mayImport ? <ButtonLink href={`/teams/${team}/models/import?model=${model.slug}`}>Import a further revision</ButtonLink> : null}
            <RevisionActions path={path} modelName={model.name} possible={possible} barred={barred} />
          </>
        }
      />
      {isBarred ? (
        <p data-screen-only className="-mt-2 mb-4 text-soft">
          {barred}
        </p>
      ) : null}
    </>
  )
}
