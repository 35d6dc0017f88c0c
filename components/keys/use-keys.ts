import { useQuery } from '@tanstack/react-query'
import { call } from '@/components/api/call'
import type { Key } from '@/lib/contract/key-operations'

/** Where the keys of a team stand in the cache. */
export const keysQueryKey = (team: string) => ['keys', team] as const

const PAGE = 200

async function readAllKeys(team: string, signal: AbortSignal): Promise<readonly Key[]> {
  const keys: Key[] = []
  for (let cursor: string | undefined; ; ) {
    const { body } = await call('listKeys', { path: { team }, query: { limit: PAGE, cursor }, signal })
    keys.push(...body.items)
    if (body.nextCursor === undefined) return keys
    cursor = body.nextCursor
  }
}

/** Every key of the team, newest first, read again when the page is looked at again. initial: what the server read for the page. */
export const useKeys = (team: string, initial: readonly Key[] | undefined) =>
  useQuery({
    queryKey: keysQueryKey(team),
    queryFn: ({ signal }) => readAllKeys(team, signal),
    ...(initial === undefined ? {} : { initialData: initial }),
    refetchInterval: 60_000,
  })
