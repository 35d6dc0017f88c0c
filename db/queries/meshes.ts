import { and, asc, eq } from 'drizzle-orm'
import { type Db, schema } from '../client'

const { meshes } = schema

/** The mesh of this path that came with a revision. */
export const findMesh = async (db: Db, revisionId: string, path: string) =>
  (await db.select().from(meshes).where(and(eq(meshes.revisionId, revisionId), eq(meshes.path, path))).limit(1))[0] ?? null

export type MeshRow = NonNullable<Awaited<ReturnType<typeof findMesh>>>

/** All that came with a revision, by path. */
export const listMeshRows = (db: Db, revisionId: string) => db.select().from(meshes).where(eq(meshes.revisionId, revisionId)).orderBy(asc(meshes.path))

export const insertMeshes = (db: Db, rows: readonly MeshRow[]) => (rows.length === 0 ? Promise.resolve() : db.insert(meshes).values([...rows]))
