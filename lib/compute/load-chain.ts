import { getDb } from '@/db/client'
import { getDescription, getFindingRows } from '@/db/queries/revisions'
import type { Caller } from '@/lib/access/caller'
import { type Located, locateRevision } from '@/lib/access/locate'
import { fail } from '@/lib/errors'
import type { Chain } from '@/lib/kinematics/chain'
import { compileChain } from '@/lib/urdf/compile-chain'
import { defaultChain } from '@/lib/urdf/default-chain'
import type { Description, Finding } from '@/lib/urdf/description'

export interface ChainChoice {
  readonly base?: string | undefined
  readonly tip?: string | undefined
}

interface Loaded {
  readonly description: Description
  readonly findings: readonly Finding[]
  readonly chains: Map<string, Chain>
}

/** How many revisions, and chains of each, are kept compiled. A revision never changes, so nothing has to be forgotten early. */
const MOST_REVISIONS = 50
const MOST_CHAINS = 50

const loaded = new Map<string, Promise<Loaded>>()

function keep<K, V>(map: Map<K, V>, key: K, value: V, most: number): V {
  map.delete(key)
  map.set(key, value)
  for (const oldest of map.keys()) {
    if (map.size <= most) break
    map.delete(oldest)
  }
  return value
}

async function read(revisionId: string): Promise<Loaded> {
  const db = await getDb()
  const [description, findings] = await Promise.all([getDescription(db, revisionId), getFindingRows(db, revisionId)])
  return { description, findings, chains: new Map() }
}

/** What was read of a revision, kept in memory. */
export function loadRevision(revisionId: string): Promise<Loaded> {
  const reading = keep(loaded, revisionId, loaded.get(revisionId) ?? read(revisionId), MOST_REVISIONS)
  reading.catch(() => loaded.delete(revisionId))
  return reading
}

/** A chain of a loaded revision; what the choice leaves out comes from the default chain. Fails with chain-not-found or chain-not-computable. */
export function chainOf({ description, chains }: Loaded, choice: ChainChoice): Chain {
  const base = choice.base ?? description.root
  const tip = choice.tip ?? defaultChain(description)?.tip ?? fail('chain-not-computable', 'No chain of this revision can be computed: every way out passes a floating or planar joint.')
  const key = JSON.stringify([base, tip])
  return keep(chains, key, chains.get(key) ?? compileChain(description, base, tip), MOST_CHAINS)
}

/** A chain of a revision, compiled: plain data, fit to be handed to a component. */
export async function loadChain(_caller: Caller, at: Pick<Located, 'revision'>, choice: ChainChoice = {}): Promise<Chain> {
  return chainOf(await loadRevision(at.revision.id), choice)
}

/** A chain of the revision of this number, compiled. Fails with revision-not-found. */
export async function loadChainOf(caller: Caller, at: Pick<Located, 'model'>, number: number, choice: ChainChoice): Promise<Chain> {
  const revision = await locateRevision(await getDb(), at.model, String(number))
  return loadChain(caller, { revision }, choice)
}
