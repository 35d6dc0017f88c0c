import clsx from 'clsx'
import { NEAR_SINGULAR } from '@/lib/kinematics/measures'

/** Singular values of the Jacobian as bars, the smallest in amber where the pose is near-singular. */
export function SingularValueBars({ values }: { readonly values: readonly number[] }) {
  const largest = values[0] ?? 1
  return (
    <ol>
      {values.map((value, place) => {
        const isLow = value < NEAR_SINGULAR
        return (
          <li key={place} className="grid grid-cols-[1rem_1fr_4rem] items-center gap-2 py-0.5">
            <span className="num text-soft">{place + 1}</span>
            <span aria-hidden className={clsx('block h-2', isLow ? 'bg-amber' : 'bg-ink')} style={{ width: `${Math.max(0.6, (100 * value) / largest)}%` }} />
            <span className={clsx('num text-right', isLow && 'text-amber')}>{value.toFixed(4)}</span>
          </li>
        )
      })}
    </ol>
  )
}
