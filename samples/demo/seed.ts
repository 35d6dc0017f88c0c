import { database } from '@/db/client'
import { countUsers, findUserByEmail } from '@/db/queries/people'
import { dataDir, demoPassword } from '@/lib/env'
import { CATALOGUE } from './catalogue'
import { TEAMS } from './people'
import { seedKey } from './seed-key'
import { seedModel } from './seed-model'
import { seedTeam } from './seed-team'

// Fills an empty database with the demo scenario, and a half-filled one with what is missing. Run before the server starts,
// because the embedded database has one user at a time.

async function seed(): Promise<void> {
  const password = demoPassword()
  if (password === undefined) throw new Error('DEMO_PASSWORD is missing: it becomes the password of the people of the demo.')
  const { db, close } = await database()
  try {
    const isStrange = (await countUsers(db)) > 0 && (await findUserByEmail(db, TEAMS[0]!.people[0]!.email)) === null
    if (isStrange) {
      throw new Error('The database holds another installation. The demo wants its own: set ELBOWROOM_DATA_DIR to another folder.')
    }
    for (const team of TEAMS) await seedTeam(db, team, password)
    for (const model of CATALOGUE) await seedModel(db, model)
    for (const team of TEAMS) await seedKey(db, team, dataDir())
  } finally {
    await close()
  }
}

try {
  await seed()
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
  process.exitCode = 1
}
