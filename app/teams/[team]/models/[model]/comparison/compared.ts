import { sidesOf, worstHref } from '@/components/comparison/worst-href'
import type { Opened } from '@/components/comparison/worst-configurations'
import { compareRevisions } from '@/lib/compute/compare-revisions'
import { loadChainOf } from '@/lib/compute/load-chain'
import { type Comparison, ComparisonQuery } from '@/lib/contract/comparison'
import { Problem } from '@/lib/errors'
import { reading } from '../../../../reading'

type Asking = Parameters<typeof compareRevisions>

interface Asked {
  readonly from: number
  readonly to: number
  readonly base?: string | undefined
  readonly tip?: string | undefined
}

/** What the page shows: the comparison with the addresses of its worst configurations, or why there is none. */
type Compared =
  | { readonly asked: Asked; readonly comparison: Comparison; readonly moves: Opened | null; readonly turns: Opened | null }
  | { readonly asked: Asked; readonly comparison: null; readonly refusal: string }

/** An empty field of the form is one that was left out; what the address cannot mean is left out, too. */
function readQuery(search: Readonly<Record<string, string | string[] | undefined>>): ComparisonQuery {
  const given = Object.entries(search).filter(([name, value]) => name in ComparisonQuery.shape && typeof value === 'string' && value !== '')
  const read = given.map(([name, value]) => [name, ComparisonQuery.shape[name as keyof ComparisonQuery].safeParse(value).data])
  return Object.fromEntries(read) as ComparisonQuery
}

/** Compares what the address of the page asks for. */
export async function compared(caller: Asking[0], at: Asking[1]['at'], search: Readonly<Record<string, string | string[] | undefined>>): Promise<Compared> {
  const query = readQuery(search)
  const { slug, latest, released } = at.model.model
  const numberOf = (name: string | undefined, fallback: number) => (name === undefined ? fallback : name === 'released' ? (released ?? latest) : Number(name))
  const to = numberOf(query.to, latest)
  const asked = { from: numberOf(query.from, Math.max(1, to - 1)), to, base: query.base, tip: query.tip }
  try {
    const { body } = await compareRevisions(caller, reading(at, query))
    const comparison = body as Comparison
    const { from, to: later, chain, effect } = comparison
    const [former, now] = await Promise.all([
      loadChainOf(caller, at, from.revision, chain.former),
      loadChainOf(caller, at, later.revision, chain),
    ])
    const sides = sidesOf(comparison, { from: former, to: now })
    const open = (worst: readonly number[] | undefined): Opened | null =>
      worst === undefined
        ? null
        : { from: worstHref(caller.team.slug, slug, sides.from, worst, chain.held), to: worstHref(caller.team.slug, slug, sides.to, worst, chain.held) }
    return { asked, comparison, moves: open(effect.translation.worst), turns: open(effect.rotation.worst) }
  } catch (error) {
    if (!(error instanceof Problem)) throw error
    return { asked, comparison: null, refusal: error.detail }
  }
}
