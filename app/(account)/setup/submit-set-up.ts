'use server'
import type { SetupForm } from '@/lib/contract/set-up'
import { setUp, type SetupOutcome } from '@/lib/teams/set-up'

/** Hands the form to the use-case, which trusts nothing of it. */
export async function submitSetUp(input: SetupForm): Promise<SetupOutcome> {
  return setUp(input)
}
