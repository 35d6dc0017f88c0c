import type { ReferencePosesResult } from '@/lib/contract/reference-poses'
import { StatedQuantity } from './stated-quantity'
import { Verdict } from './verdict'

type Outcome = Pick<ReferencePosesResult, 'passed' | 'poses' | 'failed' | 'position' | 'orientation' | 'units'>

/** The outcome of a set in one line. */
export function PosesOutcome({ outcome: { passed, poses, failed, position, orientation, units } }: { readonly outcome: Outcome }) {
  return (
    <p className="text-15">
      <Verdict passed={passed} className="mr-3" />
      {failed === 0 ? `All ${poses} poses are within the tolerance.` : `${failed} of ${poses} poses ${failed === 1 ? 'is' : 'are'} beyond the tolerance.`} Largest error{' '}
      <StatedQuantity value={position.max} kind="length" units={units} /> and <StatedQuantity value={orientation.max} kind="angle" units={units} />; mean{' '}
      <StatedQuantity value={position.mean} kind="length" units={units} /> and <StatedQuantity value={orientation.mean} kind="angle" units={units} />.
    </p>
  )
}
