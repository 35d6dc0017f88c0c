import { debounce, parseAsInteger, parseAsString, parseAsStringLiteral, useQueryStates } from 'nuqs'
import { STATUSES } from '@/components/ui/status-mark'

const PARSERS = {
  query: parseAsString.withDefault('').withOptions({ limitUrlUpdates: debounce(250) }),
  status: parseAsStringLiteral(STATUSES),
  joints: parseAsInteger,
}

/** Filters of the register in the address bar, so that a filtered list can be sent to a colleague. */
export const useFilters = () => useQueryStates(PARSERS, { history: 'replace' })
