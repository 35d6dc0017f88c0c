import { database } from '@/db/client'
import { findTeamBySlug, findUserByEmail } from '@/db/queries/people'
import { fillRegisterOf } from './large-register'

/** Fills the team of the demo with a large register: ELBOWROOM_DATA_DIR or DATABASE_URL names the database, the argument how many
 *  models of five revisions (default 10 000). The demo scenario must be there, and no server on the embedded database. */

const models = Number(process.argv[2] ?? 10_000)
const { db, close } = await database()
try {
  const team = await findTeamBySlug(db, 'tarnholm')
  const importer = await findUserByEmail(db, 'ines@tarnholm.example')
  if (team === null || importer === null) throw new Error('The demo scenario is not in this database: run `npm run demo` once.')
  await fillRegisterOf(db, {
    teamId: team.id,
    importer,
    models,
    progress: (done) => {
      if (done % 1000 === 0) process.stdout.write(`${done} models\n`)
    },
  })
} finally {
  await close()
}
