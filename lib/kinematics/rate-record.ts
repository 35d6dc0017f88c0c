import type { Chain } from './chain'
import { TWIST_SIZE } from './task'

/** Joint rates and what became of the twist that was asked for, in arrays that are kept, so that a batch allocates nothing. SI; twists
 *  at the tool point in the task's frame. What is not filled under detail 'rates' is left as it was. */
export interface RateRecord {
  /** n: scale · primaryRates + secondaryScale · secondaryRates, unless joints are saturated. */
  readonly rates: Float64Array
  /** n: what the task asks. */
  readonly primaryRates: Float64Array
  /** n: what the objectives ask of the spare freedom. */
  readonly secondaryRates: Float64Array
  /** n: 1 where a joint is held at a bound and the others have taken over for it. */
  readonly saturated: Uint8Array
  scale: number
  secondaryScale: number
  /** 6: what the tool does at `rates`, also outside the task. Not under detail 'rates', like all that follows. */
  readonly achievedTwist: Float64Array
  /** 6: achieved − asked; 0 outside the task. */
  readonly residual: Float64Array
  /** 6; the first min(components, n) are those of the unscaled task Jacobian, descending. */
  readonly singularValues: Float64Array
  rank: number
  /** The largest λ; 0 where nothing is damped. */
  damping: number
  /** Whether the pose was an easy one: of full rank, nothing damped and so nothing lost. */
  easy: boolean
}

/** An empty record for the rates of `chain`. */
export function createRateRecord(chain: Chain): RateRecord {
  const n = chain.joints.length
  return {
    rates: new Float64Array(n),
    primaryRates: new Float64Array(n),
    secondaryRates: new Float64Array(n),
    saturated: new Uint8Array(n),
    scale: 1,
    secondaryScale: 1,
    achievedTwist: new Float64Array(TWIST_SIZE),
    residual: new Float64Array(TWIST_SIZE),
    singularValues: new Float64Array(TWIST_SIZE),
    rank: 0,
    damping: 0,
    easy: false,
  }
}
