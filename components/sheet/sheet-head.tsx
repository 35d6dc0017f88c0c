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
  readonly fourEyes: string | undefined
  readonly mayImport: boolean
}

/** Name, status and note of a revision, and what this person can do with it. */
export function SheetHead({ path, model, revision, possible, fourEyes, mayImport }: SheetHeadProps) {
  const { team } = path
  const isBarred = possible.includes('released') && fourEyes !== undefined
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
            {mayImport ? <ButtonLink href={`/teams/${team}/models/import?model=${model.slug}`}>Import a further revision</ButtonLink> : null}
            <RevisionActions path={path} modelName={model.name} possible={possible} fourEyes={fourEyes} />
          </>
        }
      />
      {isBarred ? (
        <p data-screen-only className="-mt-2 mb-4 text-soft">
          {fourEyes}
        </p>
      ) : null}
    </>
  )
}
