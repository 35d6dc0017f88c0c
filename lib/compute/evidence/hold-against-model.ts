import type { Located } from '@/lib/access/locate'
import type { ReferencePoseRow, ReferencePosesQuestion, ReferencePosesResult } from '@/lib/contract/reference-poses'
import { inSlices } from '@/lib/in-slices'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { listViolations } from '@/lib/kinematics/within-limits'
import { poseDifference } from '@/lib/math/pose-difference'
import { readPose } from '../begin'
import { chainOf, loadRevision } from '../load-chain'
import { presentPose } from '../present-pose'
import { jointKinds, SiReader, SiWriter } from '../si'
import { readPoses } from './read-poses'

/** Holds the measured poses of a question against a revision: residuals and verdict of every row, in the units stated. Fails with
 *  chain-not-found, chain-not-computable, malformed-body or invalid-request. Sliced. */
export async function holdAgainstModel({ revision }: Pick<Located, 'revision'>, question: ReferencePosesQuestion): Promise<ReferencePosesResult> {
  const chain = chainOf(await loadRevision(revision.id), question.chain ?? {})
  const { units, rotation, tolerance } = question
  const read = new SiReader(units)
  const tipFromTool = question.tool === null ? undefined : readPose(read, question.tool, '/tool')
  const most = { position: read.number(tolerance.position, 'length', '/tolerance/position'), orientation: read.number(tolerance.orientation, 'angle', '/tolerance/orientation') }
  read.finish()
  const { poses, decimalMark } = await readPoses(question, chain)

  const write = new SiWriter(units)
  const kinds = jointKinds(chain)
  const work = createWorkspace(chain)
  const rows: ReferencePoseRow[] = []
  await inSlices(poses.length, (index) => {
    const { row, configuration, baseFromMeasured } = poses[index]!
    forwardKinematics(chain, configuration, work, tipFromTool)
    const { distance, angle } = poseDifference(work.baseFromTool, baseFromMeasured)
    rows.push({
      row,
      configuration: write.list(configuration, kinds),
      measured: presentPose(baseFromMeasured, write),
      computed: presentPose(work.baseFromTool, write),
      positionError: write.number(distance, 'length'),
      orientationError: write.number(angle, 'angle'),
      withinLimits: listViolations(chain, configuration).length === 0,
      passed: distance <= most.position && angle <= most.orientation,
    })
  })
  const failed = rows.filter(({ passed }) => !passed).length
  return {
    fingerprint: revision.fingerprint,
    chain: { base: chain.base, tip: chain.tip, joints: chain.joints.map(({ name }) => name), types: chain.joints.map(({ type }) => type) },
    units,
    rotation,
    tool: tipFromTool === undefined ? null : presentPose(tipFromTool, write),
    tolerance,
    decimalMark,
    poses: rows.length,
    failed,
    passed: failed === 0,
    position: deviationOf(rows.map(({ positionError }) => positionError)),
    orientation: deviationOf(rows.map(({ orientationError }) => orientationError)),
    rows,
  }
}

const deviationOf = (errors: readonly number[]) => ({
  max: errors.reduce((most, error) => Math.max(most, error), 0),
  mean: errors.reduce((sum, error) => sum + error, 0) / errors.length,
})
