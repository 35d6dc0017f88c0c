import { database } from '@/db/client'
import { insertUser } from '@/db/queries/people'

// Makes a database somebody's own: one person, who is none of the demo's.
const { db, close } = await database()
await insertUser(db, { email: 'owner@skua.example', name: 'Alva Skogheim', passwordHash: 'none' })
await close()
