import { getDb } from '@/db/client'
import { countUsers, insertMember, insertTeam, insertUser, lockSetup } from '@/db/queries/people'
import { hashPassword } from '@/lib/access/passwords'
import { deriveSlug } from '@/lib/catalog/derive-slug'
import { SetupForm } from '@/lib/contract/set-up'
import { checkSetupCode } from './setup-code'

export type SetupOutcome =
  | { readonly ok: true; readonly team: string }
  | { readonly ok: false; readonly field: keyof SetupForm | null; readonly detail: string }

const CODE_FAULTS = {
  wrong: 'This is not the code in the log. Copy it from the line "setup code" of the running service.',
  closed: 'Setting up is closed: there were too many wrong codes. Start the service again for a new code.',
}

/** Makes the first administrator and team of an empty installation. */
export async function setUp(input: SetupForm): Promise<SetupOutcome> {
  const parsed = SetupForm.safeParse(input)
  if (!parsed.success) {
    const [issue] = parsed.error.issues
    return { ok: false, field: (issue?.path[0] as keyof SetupForm | undefined) ?? null, detail: issue?.message ?? 'Something is missing.' }
  }
  const form = parsed.data
  const verdict = checkSetupCode(form.code)
  if (verdict !== 'right') return { ok: false, field: 'code', detail: CODE_FAULTS[verdict] }
  const passwordHash = await hashPassword(form.password)
  const slug = deriveSlug(form.teamName)
  return (await getDb()).transaction(async (db): Promise<SetupOutcome> => {
    // Two people with the same code: the second finds the work done.
    await lockSetup(db)
    if ((await countUsers(db)) > 0) return { ok: false, field: null, detail: 'This installation is already set up. Sign in instead.' }
    const user = await insertUser(db, { email: form.email, name: form.name, passwordHash })
    const team = await insertTeam(db, { slug, name: form.teamName })
    await insertMember(db, { teamId: team.id, userId: user.id, role: 'administrator' })
    return { ok: true, team: team.slug }
  })
}
