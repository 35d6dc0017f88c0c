import { getDb } from '@/db/client'
import { getSourceBytes } from '@/db/queries/revisions'
import type { Ask } from '@/lib/access/use-case'
import type { Caller } from '@/lib/access/caller'
import { decodeXml } from '@/lib/urdf/decode-xml'

/** The file of a revision as text, for the page that shows it. */
export async function readSource(_caller: Caller, { at }: Pick<Ask<'getSource'>, 'at'>): Promise<{ text: string; fileName: string }> {
  const bytes = await getSourceBytes(await getDb(), at.revision.id)
  return { text: decodeXml(bytes), fileName: at.revision.fileName }
}
