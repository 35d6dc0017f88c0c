'use client'

import { Button } from '@/components/ui/button'
import { SelectField } from '@/components/ui/select-field'
import { STATUSES, statusWord } from '@/components/ui/status-mark'
import { TextField } from '@/components/ui/text-field'
import type { useFilters } from './filters'

interface RegisterFiltersProps {
  readonly filters: ReturnType<typeof useFilters>[0]
  readonly onChange: ReturnType<typeof useFilters>[1]
}

const STATUS_OPTIONS = [{ value: '', label: 'any status' }, ...STATUSES.map((status) => ({ value: status, label: statusWord(status) }))]

/** Search as you type, and the two filters; all of it stands in the address. */
export function RegisterFilters({ filters, onChange }: RegisterFiltersProps) {
  const isFiltered = filters.query !== '' || filters.status !== null || filters.joints !== null
  return (
    <search aria-label="Models" className="mb-4 grid grid-cols-2 items-end gap-3 tablet:flex tablet:flex-wrap">
      <TextField
        label="Search"
        type="search"
        className="col-span-2 tablet:w-80"
        placeholder="name, slug or note"
        value={filters.query}
        maxLength={200}
        autoComplete="off"
        spellCheck={false}
        onChange={(event) => void onChange({ query: event.target.value || null })}
      />
      <SelectField
        label="Has a revision"
        className="tablet:w-40"
        options={STATUS_OPTIONS}
        value={filters.status ?? ''}
        onChange={(event) => void onChange({ status: STATUSES.find((status) => status === event.target.value) ?? null })}
      />
      <TextField
        label="Joints"
        className="tablet:w-24"
        type="number"
        min={0}
        max={10_000}
        placeholder="any"
        value={filters.joints ?? ''}
        onChange={(event) => void onChange({ joints: event.target.value === '' ? null : event.target.valueAsNumber })}
      />
      {isFiltered ? (
        <Button variant="quiet" onClick={() => void onChange({ query: null, status: null, joints: null })}>
          Clear
        </Button>
      ) : null}
    </search>
  )
}
