import { createColumnHelper, createSortedRowModel, rowSortingFeature, sortFn_text, tableFeatures } from '@tanstack/react-table'
import { Timestamp } from '@/components/ui/timestamp'
import type { Key } from '@/lib/contract/key-operations'
import { KeyEditDialog } from './key-edit-dialog'
import { KeyExpiry } from './key-expiry'
import { KeyRevokeDialog } from './key-revoke-dialog'

export const keyFeatures = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel(), sortFns: { text: sortFn_text } })

const column = createColumnHelper<typeof keyFeatures, Key>()

/** Sorts behind every date. */
const NEVER = '9999'

/** The columns of the keys table. now: ms since the epoch. */
export const keyColumns = (team: string, now: number) =>
  column.columns([
    column.accessor('label', {
      header: 'Key',
      sortFn: 'text',
      cell: ({ row: { original } }) => (
        <>
          <bdi className="block font-semibold break-words">{original.label}</bdi>
          <span className="num text-soft">{original.prefix}…</span>
          <span className="block tablet:hidden">{original.scopes.join(', ')}</span>
        </>
      ),
    }),
    column.accessor((key) => key.scopes.join(' '), {
      id: 'scopes',
      header: 'Scopes',
      sortFn: 'text',
      cell: ({ row: { original } }) => original.scopes.map((scope) => <code key={scope} className="block whitespace-nowrap">{scope}</code>),
    }),
    column.accessor((key) => key.revokedAt ?? key.expiresAt ?? NEVER, {
      id: 'state',
      header: 'State',
      sortFn: 'text',
      cell: ({ row: { original } }) => <KeyExpiry item={original} now={now} />,
    }),
    column.accessor((key) => key.lastUsedAt ?? '', {
      id: 'lastUsedAt',
      header: 'Last use',
      sortFn: 'text',
      cell: ({ row: { original } }) =>
        original.lastUsedAt === undefined ? (
          <span className="text-soft">never used</span>
        ) : (
          <Timestamp at={original.lastUsedAt} />
        ),
    }),
    column.accessor('createdAt', {
      header: 'Made',
      sortFn: 'text',
      cell: ({ row: { original } }) => (
        <>
          <Timestamp at={original.createdAt} />
          <bdi className="block text-soft">{original.createdBy}</bdi>
        </>
      ),
    }),
    column.display({
      id: 'acts',
      header: () => <span className="sr-only">Acts</span>,
      cell: ({ row: { original } }) =>
        original.state === 'revoked' ? null : (
          <div className="flex flex-wrap justify-end gap-2">
            <KeyEditDialog team={team} item={original} />
            <KeyRevokeDialog team={team} item={original} />
          </div>
        ),
    }),
  ])
