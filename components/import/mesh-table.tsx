import clsx from 'clsx'
import { Mark } from '@/components/ui/marks'
import { RowHead, Table, Td, Th } from '@/components/ui/table'
import type { MeshReference } from '@/lib/contract/mesh'
import { fileSizeText } from './file-size'

/** As many are shown; a supplier's arm has twenty. */
const MOST_ROWS = 200

const STATES = { found: 'found', missing: 'missing', outside: 'outside, not followed' } as const

interface MeshTableProps {
  readonly meshes: readonly MeshReference[]
  /** Address of a mesh that is stored; left out before it is. */
  readonly hrefOf?: (path: string) => string
}

/** Each mesh that a description refers to, and where it was found. */
export function MeshTable({ meshes, hrefOf }: MeshTableProps) {
  const shown = meshes.slice(0, MOST_ROWS)
  return (
    <>
      <Table caption="Meshes that the description refers to">
        <thead>
          <tr>
            <Th>Written as</Th>
            <Th>In the archive</Th>
            <Th align="right">Size</Th>
          </tr>
        </thead>
        <tbody>
          {shown.map(({ filename, state, path, size }) => (
            <tr key={filename}>
              <RowHead className="num min-w-28 break-all tablet:min-w-40">
                <bdi dir="ltr">{filename}</bdi>
              </RowHead>
              <Td className={clsx('min-w-28 tablet:min-w-40', state === 'found' ? 'num break-all' : 'text-amber [overflow-wrap:normal]')}>
                {path === undefined ? (
                  <span className="inline-flex items-center gap-1.5">
                    <Mark name="warning" className="size-3 shrink-0" />
                    {STATES[state]}
                  </span>
                ) : hrefOf === undefined ? (
                  <bdi dir="ltr">{path}</bdi>
                ) : (
                  <a href={hrefOf(path)} download className="text-blue underline-offset-3 hover:underline">
                    <bdi dir="ltr">{path}</bdi>
                  </a>
                )}
              </Td>
              <Td align="right">{size === undefined ? '' : fileSizeText(size)}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {shown.length < meshes.length ? <p className="label mt-1">{meshes.length - shown.length} more are in the API.</p> : null}
    </>
  )
}

/** How many were found, in words. */
export function meshCountText(meshes: readonly MeshReference[]): string {
  const found = meshes.filter(({ state }) => state === 'found').length
  return `${found} of ${meshes.length} found`
}
