import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { quaternionOf } from '@/lib/math/quaternion'
import { positionOf } from '@/lib/math/rigid-transform'
import { mmFromM, radFromDeg } from '@/lib/units'
import { sampleArm } from '../sample-arm'

const shown = (value: number, digits: number): string => String(Number(value.toFixed(digits)) + 0)

/** The pose that the first call of the docs answers for the sample arm, computed as the service computes it: lines of JSON.
 *  q: deg. */
export async function firstAnswer(q: readonly number[]): Promise<string> {
  const chain = await sampleArm()
  const work = createWorkspace(chain)
  forwardKinematics(chain, q.map(radFromDeg), work)
  const position = positionOf(work.baseFromTip).map((value) => shown(mmFromM(value), 6))
  const quaternion = [...quaternionOf(work.baseFromTip)].map((value) => shown(value, 9))
  return `{
  "model": { "team": "…", "model": "skerry-7", "revision": 1, "status": "…", "fingerprint": "…" },
  "chain": { "base": "${chain.base}", "tip": "${chain.tip}",
             "joints": [${chain.joints.map((joint) => `"${joint.name}"`).join(', ')}], "types": […] },
  "units": { "length": "mm", "angle": "deg" },
  "characteristicLength": 1,
  "results": [
    { "pose": { "position": [${position.join(', ')}],
                "quaternion": [${quaternion.join(', ')}] },
      "withinLimits": true, "violations": [] }
  ]
}`
}
