import type { Db } from '@/db/client'
import { findMembership, findTeamBySlug, findUserByEmail, insertMember, insertTeam, insertUser } from '@/db/queries/people'
import { setPasswordHash } from '@/db/queries/set-password-hash'
import { hashPassword, isPassword } from '@/lib/access/passwords'
import type { DemoTeam } from './people'

/** Makes the team and its people where they are missing; everyone has `password` afterwards. */
export async function seedTeam(db: Db, { slug, name, evidenceRequired, people }: DemoTeam, password: string): Promise<void> {
  // The people come before the team: a database with people in it and none of ours is somebody's installation.
  const ids = new Map<string, string>()
  for (const person of people) {
    const known = await findUserByEmail(db, person.email)
    if (known !== null && !(await isPassword(password, known.passwordHash))) {
      await setPasswordHash(db, known.id, await hashPassword(password))
    }
    const user = known ?? (await insertUser(db, { email: person.email, name: person.name, passwordHash: await hashPassword(password) }))
    ids.set(person.email, user.id)
  }
  const team = (await findTeamBySlug(db, slug)) ?? (await insertTeam(db, { slug, name, evidenceRequired }))
  for (const { email, role } of people) {
    const userId = ids.get(email)!
    if ((await findMembership(db, userId, slug)) === null) await insertMember(db, { teamId: team.id, userId, role })
  }
}
