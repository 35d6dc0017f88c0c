'use client'

import { useCallback, useRef } from 'react'
import { sentenceOf } from '@/components/api/refusal'
import { Notice } from '@/components/shell/notice'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { SkeletonRows } from '@/components/ui/skeleton'
import { useFilters } from './filters'
import { ModelRows } from './model-rows'
import type { ModelRowsHandle } from './model-rows'
import { RegisterFilters } from './register-filters'
import { useRegister } from './use-register'
import type { RegisterStart } from './use-register'

interface RegisterProps {
  readonly team: string
  readonly start: RegisterStart
  readonly mayImport: boolean
}

/** The register: find a model among thousands. */
export function Register({ team, start, mayImport }: RegisterProps) {
  const [filters, setFilters] = useFilters()
  const { models, error, hasNextPage, fetchNextPage, isFetching, isFetchingNextPage, isPending, refetch } = useRegister(team, filters, start)
  const isFiltered = filters.query !== '' || filters.status !== null || filters.joints !== null
  const rows = useRef<ModelRowsHandle>(null)
  const search = useRef<HTMLInputElement>(null)
  const more = useCallback(() => {
    if (!isFetchingNextPage) void fetchNextPage()
  }, [fetchNextPage, isFetchingNextPage])

  if (models.length === 0 && !isFiltered && !isFetching && error === null) {
    return (
      <EmptyState
        title="No model yet"
        action={
          mayImport ? (
            <ButtonLink href={`/teams/${team}/models/import`} variant="primary">
              Import a URDF
            </ButtonLink>
          ) : undefined
        }
      >
        A model is a robot description under a name, with numbered revisions.{' '}
        {mayImport ? 'Import a supplier’s URDF to make the first; you see what the importer has to say before anything is stored.' : 'An engineer of the team imports the first one.'}
      </EmptyState>
    )
  }
  return (
    <>
      <RegisterFilters filters={filters} onChange={setFilters} search={search} onDown={() => rows.current?.focusFirst()} />
      {error === null ? null : (
        <div className="mb-4">
          <Notice title="The list could not be read" tone="error" actions={<Button onClick={() => void refetch()}>Try again</Button>}>
            {sentenceOf(error)}
          </Notice>
        </div>
      )}
      <p role="status" className="label mb-1">
        {isPending ? '' : `${models.length}${hasNextPage ? ' and more' : ''} ${models.length === 1 && !hasNextPage ? 'model' : 'models'}${isFiltered ? ' match' : ''}`}
      </p>
      {isPending ? (
        <SkeletonRows rows={8} />
      ) : models.length === 0 ? (
        <EmptyState title="No model matches" action={<Button onClick={() => setFilters({ query: null, status: null, joints: null })}>Clear the filters</Button>}>
          Search looks at names, slugs, notes and the robot’s name in the file, whatever the case and the accents.
        </EmptyState>
      ) : (
        <ModelRows ref={rows} team={team} models={models} hasMore={hasNextPage} onEnd={more} onSearch={() => search.current?.focus()} />
      )}
      {isFetchingNextPage ? <SkeletonRows rows={2} /> : null}
    </>
  )
}
