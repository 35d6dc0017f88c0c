import { createColumnHelper, createSortedRowModel, rowSortingFeature, sortFn_text, tableFeatures } from '@tanstack/react-table'
import clsx from 'clsx'
import { Timestamp } from '@/components/ui/timestamp'
import type { Key } from '@/lib/contract/key-operations'
import { KeyEditDialog } from './key-edit-dialog'
import { KeyExpiry } from './key-expiry'
import { KeyRevokeDialog } from './key-revoke-dialog'

export const keyFeatures = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel(), sortFns: { text: sortFn_text } })

const column = createColumnHelper<typeof keyFeatures, Key>()

/** What can be done with a key; nothing with a revoked one. */
const KeyActs = ({ team, item, className }: { readonly team: string; readonly item: Key; readonly className: string }) =>
  item.state === 'revoked' ? null : (
    <div className={clsx('flex-wrap gap-2', className)}>
      <KeyEditDialog team={team} item={item} />
      <KeyRevokeDialog team={team} item={item} />
    </div>
  )

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
          <span className="block text-soft tablet:hidden">
            {original.lastUsedAt === undefined ? 'never used' : <>used <Timestamp at={original.lastUsedAt} /></>}
          </span>
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
      cell: ({ row: { original } }) => (
        <>
          <KeyExpiry item={original} now={now} />
          <KeyActs team={team} item={original} className="mt-2 flex tablet:hidden" />
        </>
      ),
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
      cell: ({ row: { original } }) => <KeyActs team={team} item={original} className="flex justify-end" />,
    }),
  ])
