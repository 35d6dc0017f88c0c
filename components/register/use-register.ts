import { keepPreviousData, useInfiniteQuery } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import type { Answer } from '@/components/api/ask'
import { call } from '@/components/api/call'
import type { Filters } from './filters'
import { questionOf } from './question'
import type { RegisterQuestion } from './question'

type RegisterPage = Answer<'listModels'>

/** A value that has stood still for a while. */
function useSettled<T>(value: T, ms: number): T {
  const [settled, setSettled] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), ms)
    return () => clearTimeout(timer)
  }, [value, ms])
  return settled
}

/** What the server answered for the page, and to which question. */
export interface RegisterStart {
  readonly question: RegisterQuestion
  readonly page: RegisterPage
}

/** The models that match the filters, page after page. */
export function useRegister(team: string, filters: Filters, start: RegisterStart) {
  const key = useSettled(JSON.stringify(questionOf({ ...filters })), 150)
  const list = useInfiniteQuery({
    queryKey: ['register', team, key],
    queryFn: async ({ pageParam, signal }) => {
      const query = { ...(JSON.parse(key) as RegisterQuestion), cursor: pageParam, limit: 100 }
      return (await call('listModels', { path: { team }, query, signal })).body
    },
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor,
    ...(key === JSON.stringify(start.question) ? { initialData: { pages: [start.page], pageParams: [undefined] } } : {}),
    placeholderData: keepPreviousData,
  })
  return { ...list, models: list.data?.pages.flatMap((page) => page.items) ?? [] }
}
