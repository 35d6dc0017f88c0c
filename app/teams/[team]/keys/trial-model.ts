import type { TrialModel } from '@/components/keys/first-request'
import type { Caller } from '@/lib/access/caller'
import { listModels } from '@/lib/catalog/list-models'
import { loadChain } from '@/lib/compute/load-chain'
import { Problem } from '@/lib/errors'
import { visit } from '@/lib/http/visit'
import { reading } from '../../reading'

/** A revision in force on which a new key can be tried; null when the team has none that computes. */
export async function findTrialModel(caller: Caller, team: string): Promise<TrialModel | null> {
  const { at } = await visit('listModels', { team })
  const { body } = await listModels(caller, reading(at, { status: 'released', limit: 20 }))
  const model = body.items.find(({ released }) => released !== undefined)
  if (model === undefined) return null
  const revision = await visit('getRevision', { team, model: model.slug, revision: String(model.released) })
  try {
    const chain = await loadChain(caller, revision.at)
    return { path: `/teams/${team}/models/${model.slug}/revisions/released`, joints: chain.joints.length }
  } catch (error) {
    if (error instanceof Problem && error.code === 'chain-not-computable') return null
    throw error
  }
}
