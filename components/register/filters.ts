import { debounce, parseAsInteger, parseAsString, parseAsStringLiteral, useQueryStates } from 'nuqs'
import { STATUSES, type Status } from '@/components/ui/status-mark'
import { historyFor } from './history-for'

const PARSERS = {
  query: parseAsString.withDefault('').withOptions({ limitUrlUpdates: debounce(250) }),
  status: parseAsStringLiteral(STATUSES),
  joints: parseAsInteger,
}

export interface Filters {
  readonly query: string
  readonly status: Status | null
  readonly joints: number | null
}

/** What is to be another; null takes a filter away. */
export type FilterChange = Partial<{ [K in keyof Filters]: Filters[K] | null }>

/** Filters of the register in the address bar, so that a filtered list can be sent to a colleague, and that going back leads to the
 *  list as it was before a filter. */
export function useFilters(): readonly [Filters, (change: FilterChange) => void] {
  const [filters, set] = useQueryStates(PARSERS)
  return [filters, (change) => void set(change, { history: historyFor(change, new URLSearchParams(window.location.search)) })]
}
