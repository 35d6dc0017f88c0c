import type { Chain } from './chain'

/** What spare freedom is spent on. posture: n values to come near to (rad or m); mid-range: the middles of the joint ranges. gain in SI. */
export type Objective =
  | { readonly objective: 'posture'; readonly posture: ArrayLike<number>; readonly gain: number }
  | { readonly objective: 'mid-range'; readonly gain: number }

/** Narrower than this a range cannot be squared and divided by; it leaves no room to move in either. */
const NARROWEST_RANGE = 1e-100

/** Fills `wish` (n; rad/s or m/s) with the sum of the objectives' gradients at `q`, each times its gain, before any projection.
 *  Throws a RangeError when a posture has another length. Liégeois 1977. */
export function fillWish(chain: Chain, q: ArrayLike<number>, objectives: readonly Objective[], wish: Float64Array): void {
  wish.fill(0)
  for (const objective of objectives) {
    if (objective.objective === 'posture') addPosture(chain, q, objective.posture, objective.gain, wish)
    else addMidRange(chain, q, objective.gain, wish)
  }
}

/** −gain·(q − posture), the short way round on continuous joints only: a revolute joint cannot go round. */
function addPosture(chain: Chain, q: ArrayLike<number>, posture: ArrayLike<number>, gain: number, wish: Float64Array): void {
  if (posture.length !== wish.length) throw new RangeError(`a posture needs ${wish.length} joint values, ${posture.length} were given`)
  for (let i = 0; i < wish.length; i++) {
    const difference = q[i]! - posture[i]!
    wish[i]! -= gain * (chain.joints[i]!.type === 'continuous' ? shortWayRound(difference) : difference)
  }
}

/** The angle in [−pi, pi] that differs from `angle` (rad) by whole turns; unchanged where it is there already. */
function shortWayRound(angle: number): number {
  return Math.abs(angle) <= Math.PI ? angle : Math.atan2(Math.sin(angle), Math.cos(angle))
}

/** The gradient −(1/n)(q − middle)/(upper − lower)². A joint without both bounds, or with an empty range, contributes nothing.
 *  Siciliano, Sciavicco, Villani & Oriolo 2009, section 3.5.1. */
function addMidRange(chain: Chain, q: ArrayLike<number>, gain: number, wish: Float64Array): void {
  for (let i = 0; i < wish.length; i++) {
    const { lower, upper } = chain.joints[i]!
    if (lower === null || upper === null) continue
    const range = upper - lower
    if (range > NARROWEST_RANGE) wish[i]! -= (gain * (q[i]! - (lower + upper) / 2)) / wish.length / range / range
  }
}
