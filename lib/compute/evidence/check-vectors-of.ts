import { CHECK_SEED, CHECK_VECTORS, type CheckVectors } from '@/lib/contract/check-vectors'
import { inSlices } from '@/lib/in-slices'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { measures } from '@/lib/kinematics/measures'
import { configurationSource } from '@/lib/kinematics/seeded-configurations'
import { createTask } from '@/lib/kinematics/task'
import { SI } from '@/lib/units'
import { presentPose } from '../present-pose'
import { jointKinds, SiWriter } from '../si'

/** The check vectors of a chain: the same bits for the same chain, whenever they are asked for. SI, base axes. Sliced. */
export async function checkVectorsOf(chain: Chain): Promise<CheckVectors['vectors']> {
  const write = new SiWriter(SI)
  const kinds = jointKinds(chain)
  const task = createTask()
  const work = createWorkspace(chain)
  const next = configurationSource(chain.joints, CHECK_SEED)
  const vectors: CheckVectors['vectors'] = []
  await inSlices(CHECK_VECTORS, () => {
    const q = next()
    forwardKinematics(chain, q, work)
    const pose = presentPose(work.baseFromTip, write)
    const matrix = write.jacobian(jacobian(chain, work), kinds)
    vectors.push({ configuration: Array.from(q), pose, jacobian: matrix, singularValues: measures(chain, work, task).singularValues })
  })
  return vectors
}
