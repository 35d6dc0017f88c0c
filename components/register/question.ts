import { STATUSES, type Status } from '@/components/ui/status-mark'

/** What the register is asked for: filters that are not set are left out. */
export interface RegisterQuestion {
  readonly query?: string
  readonly status?: Status
  readonly joints?: number
}

const MOST_JOINTS = 10_000

/** The question in the address or the filters of a register; what makes no sense there is left out. */
export function questionOf(given: Readonly<Record<string, unknown>>): RegisterQuestion {
  const query = typeof given.query === 'string' ? given.query.trim().slice(0, 200) : ''
  const status = STATUSES.find((one) => one === given.status)
  const joints = given.joints === '' || given.joints == null ? Number.NaN : Number(given.joints)
  return {
    ...(query === '' ? {} : { query }),
    ...(status === undefined ? {} : { status }),
    ...(Number.isInteger(joints) && joints >= 0 && joints <= MOST_JOINTS ? { joints } : {}),
  }
}
