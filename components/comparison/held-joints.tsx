import { Quantity } from '@/components/ui/quantity'
import type { Comparison } from '@/lib/contract/comparison'

type Held = Comparison['chain']['held'][number]

/** Joints that took no part, and why: what was compared must be plain. */
export function HeldJoints({ comparison: { from, to, chain } }: { readonly comparison: Comparison }) {
  if (chain.held.length === 0) return null
  const why = (held: Held): string =>
    held.in === 'both' ? 'the two ranges do not meet; it stands in the middle between them, at' : `only revision ${held.in === 'from' ? from.revision : to.revision} moves the tip by it; it stands at`
  return (
    <section aria-labelledby="comparison-held">
      <h2 id="comparison-held">Joints that stand still here</h2>
      <ul className="mt-1 border-t border-ink">
        {chain.held.map((held) => (
          <li key={`${held.in} ${held.joint}`} className="border-b border-hair px-2 py-1.5">
            <bdi className="num">{held.joint}</bdi>: {why(held)} <Quantity value={held.value} kind={held.quantity} withUnit />
          </li>
        ))}
      </ul>
    </section>
  )
}
