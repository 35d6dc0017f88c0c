'use client'

import { Button } from '@/components/ui/button'
import { SelectField } from '@/components/ui/select-field'
import { STATUSES, statusWord } from '@/components/ui/status-mark'
import { TextField } from '@/components/ui/text-field'
import type { RefObject } from 'react'
import type { FilterChange, Filters } from './filters'

interface RegisterFiltersProps {
  readonly filters: Filters
  readonly onChange: (change: FilterChange) => void
  readonly search: RefObject<HTMLInputElement | null>
  /** Called when the arrow down is pressed in the search. */
  readonly onDown: () => void
}

const STATUS_OPTIONS = [{ value: '', label: 'any status' }, ...STATUSES.map((status) => ({ value: status, label: statusWord(status) }))]

/** Search as you type, and the two filters; all of it stands in the address. */
export function RegisterFilters({ filters, onChange, search, onDown }: RegisterFiltersProps) {
  const isFiltered = filters.query !== '' || filters.status !== null || filters.joints !== null
  return (
    <search aria-label="Models" className="mb-4 grid grid-cols-2 items-end gap-3 tablet:flex tablet:flex-wrap">
      <TextField
        ref={search}
        label="Search"
        type="search"
        className="col-span-2 tablet:w-80"
        placeholder="name, slug, note or robot name"
        value={filters.query}
        maxLength={200}
        autoComplete="off"
        spellCheck={false}
        aria-keyshortcuts="ArrowDown"
        onChange={(event) => onChange({ query: event.target.value || null })}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown') return
          event.preventDefault()
          onDown()
        }}
      />
      <SelectField
        label="Has a revision"
        className="tablet:w-40"
        options={STATUS_OPTIONS}
        value={filters.status ?? ''}
        onChange={(event) => onChange({ status: STATUSES.find((status) => status === event.target.value) ?? null })}
      />
      <TextField
        label="Joints"
        className="tablet:w-24"
        type="number"
        min={0}
        max={10_000}
        placeholder="any"
        value={filters.joints ?? ''}
        onChange={(event) => onChange({ joints: event.target.value === '' ? null : event.target.valueAsNumber })}
      />
      {isFiltered ? (
        <Button variant="quiet" onClick={() => onChange({ query: null, status: null, joints: null })}>
          Clear
        </Button>
      ) : null}
    </search>
  )
}
