import { Mark } from '@/components/ui/marks'
import type { Chain } from '@/lib/kinematics/chain'
import { listViolations } from '@/lib/kinematics/within-limits'

/** Says which joints of the configuration drawn lie outside their limits. */
export function OutsideLimits({ chain, q }: { readonly chain: Chain; readonly q: readonly number[] }) {
  const names = listViolations(chain, q).map(({ joint }) => joint)
  return (
    <p role="status" className="font-medium text-amber empty:hidden">
      {names.length === 0 ? null : (
        <>
          <Mark name="warning" className="mr-1.5 inline size-3.5" />
          Outside its limits here: {names.join(', ')}.
        </>
      )}
    </p>
  )
}
