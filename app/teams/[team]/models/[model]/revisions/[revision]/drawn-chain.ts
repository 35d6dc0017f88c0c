import { postureToDraw } from '@/components/drawing/posture-to-draw'
import { loadChain } from '@/lib/compute/load-chain'
import { Problem } from '@/lib/errors'
import type { Chain } from '@/lib/kinematics/chain'

/** The chain that a sheet shows. resting: the configuration it is drawn at unless the address says another; null for a
 *  chain that is too long to draw. refusal: why the chain asked for is not shown, or why there is none. */
export interface DrawnChain {
  readonly chain: Chain | null
  readonly isDefault: boolean
  readonly resting: readonly number[] | null
  readonly refusal?: string
}

/** Beyond this many joints a drawing would be a blot, and its scratch memory grows with the square. */
const MOST_DRAWN_JOINTS = 150

type Loading = Parameters<typeof loadChain>

function drawn(chain: Chain, isDefault: boolean): DrawnChain {
  return { chain, isDefault, resting: chain.joints.length > MOST_DRAWN_JOINTS ? null : postureToDraw(chain) }
}

/** Loads the chain asked for; where it cannot be had, the default chain with the reason. */
export async function drawnChain(caller: Loading[0], at: Loading[1], asked: { base?: string | undefined; tip?: string | undefined }): Promise<DrawnChain> {
  const isDefault = asked.base === undefined && asked.tip === undefined
  try {
    return drawn(await loadChain(caller, at, asked), isDefault)
  } catch (error) {
    if (!(error instanceof Problem) || (error.code !== 'chain-not-found' && error.code !== 'chain-not-computable')) throw error
    if (isDefault) return { chain: null, isDefault, resting: null, refusal: error.detail }
    return { ...(await drawnChain(caller, at, {})), refusal: `${error.detail} The default chain is shown.` }
  }
}
