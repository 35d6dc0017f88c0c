import type { UseCase } from '@/lib/access/use-case'
import { checkFiles } from '@/lib/storage/kept-file'
import { listFiles } from './list-files'
import { zipStream } from './zip-stream'

/** Everything of a model as one archive. What the file storage must give is looked for before the first byte is sent. */
export const exportModel: UseCase<'exportModel'> = async (caller, { at }) => {
  const files = await listFiles(caller, at)
  await checkFiles(files.flatMap(({ digest }) => digest ?? []))
  const { slug } = at.model.model
  return { body: zipStream(files, { team: caller.team.slug, model: slug }), fileName: `${slug}-export.zip` }
}
