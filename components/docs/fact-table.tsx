import type { ReactNode } from 'react'
import { RowHead, Table, Td, Th } from '@/components/ui/table'

interface FactTableProps {
  readonly caption: string
  readonly heads: readonly string[]
  readonly rows: readonly (readonly ReactNode[])[]
}

/** A small table of the docs; the first cell names its row. */
export function FactTable({ caption, heads, rows }: FactTableProps) {
  return (
    <div className="mt-3">
      <Table caption={caption} className="mt-0 text-13 leading-5">
        <thead>
          <tr>
            {heads.map((head) => (
              <Th key={head}>{head}</Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, place) => (
            <tr key={place}>
              {row.map((cell, column) =>
                column === 0 ? (
                  <RowHead key={column} className="font-medium">
                    {cell}
                  </RowHead>
                ) : (
                  <Td key={column}>{cell}</Td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  )
}
