import { z } from 'zod'
import { Digest } from './scalars'

/** A mesh that a description refers to, and where it is. */
export const MeshReference = z
  .strictObject({
    filename: z.string().meta({ description: 'As the description writes it.' }),
    state: z.enum(['found', 'missing', 'outside']).meta({ description: 'outside: an absolute path, an address or a way up; never followed.' }),
    path: z.string().optional().meta({ description: 'In the archive; package:// and relative paths resolve by the longest common path.' }),
    size: z.int().optional().meta({ description: 'bytes' }),
  })
  .meta({ id: 'MeshReference' })
export type MeshReference = z.infer<typeof MeshReference>

/** A mesh, or what belongs to one, that came in an archive. */
export const MeshFile = z
  .strictObject({
    path: z.string().meta({ description: 'In the archive; the address of the mesh under …/meshes/.' }),
    size: z.int().meta({ description: 'bytes' }),
    digest: Digest.meta({ description: 'SHA-256 of its bytes.' }),
    mediaType: z.string(),
  })
  .meta({ id: 'MeshFile' })
export type MeshFile = z.infer<typeof MeshFile>

const LONGEST_ENTRY = 1024

/** The form field that chooses a description in an archive with several. */
export const ArchiveEntryField = z.string().min(1).max(LONGEST_ENTRY).optional().meta({ description: 'Of an archive with several URDFs: the path of the one that is meant.' })
