'use client'

import { useTable } from '@tanstack/react-table'
import clsx from 'clsx'
import { useMemo } from 'react'
import { Table, Td, Th } from '@/components/ui/table'
import type { Key } from '@/lib/contract/key-operations'
import { keyColumns, keyFeatures } from './key-columns'

interface KeysTableProps {
  readonly team: string
  readonly keys: readonly Key[]
  /** ms since the epoch. */
  readonly now: number
}

/** Columns that a phone leaves out; what matters of them stands in the two that are left. */
const WIDE_ONLY = new Set(['scopes', 'lastUsedAt', 'createdAt', 'acts'])

/** The keys, sortable by every column. */
export function KeysTable({ team, keys, now }: KeysTableProps) {
  const columns = useMemo(() => keyColumns(team, now), [team, now])
  const data = useMemo(() => [...keys], [keys])
  const table = useTable({ features: keyFeatures, columns, data, getRowId: (key) => key.id })
  return (
    <Table caption="Keys of the team">
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => {
              const sorted = header.column.getIsSorted()
              return (
                <Th
                  key={header.id}
                  className={clsx(WIDE_ONLY.has(header.column.id) && 'max-tablet:hidden')}
                  aria-sort={sorted === false ? undefined : sorted === 'asc' ? 'ascending' : 'descending'}
                >
                  {header.column.getCanSort() ? (
                    <button type="button" onClick={header.column.getToggleSortingHandler()} className="min-h-6 font-semibold hover:text-blue">
                      <table.FlexRender header={header} />
                      <span aria-hidden>{sorted === false ? '' : sorted === 'asc' ? ' ▴' : ' ▾'}</span>
                    </button>
                  ) : (
                    <table.FlexRender header={header} />
                  )}
                </Th>
              )
            })}
          </tr>
        ))}
      </thead>
      <tbody>
        {table.getRowModel().rows.map((row) => (
          <tr key={row.id} id={row.id} className="scroll-mt-16 target:bg-wash">
            {row.getAllCells().map((cell) => (
              <Td key={cell.id} className={clsx('align-top', WIDE_ONLY.has(cell.column.id) && 'max-tablet:hidden')}>
                <table.FlexRender cell={cell} />
              </Td>
            ))}
          </tr>
        ))}
      </tbody>
    </Table>
  )
}
