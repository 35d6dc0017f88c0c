import type { WritingUseCase } from '@/lib/access/use-case'
import { readCheck } from './reader-pool'

/** What the importer has to say about a file, and what it would store. Stores nothing. */
export const checkImport: WritingUseCase<'checkImport'> = async (_caller, { form, file }) => ({ body: undefined, written: await readCheck(file, form.entry) })
