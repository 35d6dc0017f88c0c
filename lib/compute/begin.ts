import type { z } from 'zod'
import type { Caller } from '@/lib/access/caller'
import type { Located } from '@/lib/access/locate'
import type { ModelReference } from '@/lib/contract/kinematic-answers'
import type { PoseQuestion } from '@/lib/contract/kinematic-quantities'
import type { ForwardKinematicsQuestion } from '@/lib/contract/kinematic-questions'
import { fail } from '@/lib/errors'
import { inSlices } from '@/lib/in-slices'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace, type Workspace } from '@/lib/kinematics/create-workspace'
import { type Task, createTask, type TaskFrame, type TwistComponent } from '@/lib/kinematics/task'
import { transformOfPose } from '@/lib/math/quaternion'
import { chainOf, loadRevision } from './load-chain'
import { fullUnits, jointKinds, type Kind, POSITION_KINDS, SiReader, SiWriter } from './si'
import { touchingFindings } from './touching-findings'

type CommonQuestion = Pick<ForwardKinematicsQuestion, 'chain' | 'units' | 'tool' | 'characteristicLength'> & Partial<Pick<ForwardKinematicsQuestion, 'configurations'>>

/** What every kinematics question starts from, in SI. */
export interface Begun {
  readonly chain: Chain
  readonly work: Workspace
  readonly kinds: readonly Kind[]
  readonly configurations: readonly (readonly number[])[]
  readonly tipFromTool: Float64Array | undefined
  readonly characteristicLength: number
  readonly read: SiReader
  readonly write: SiWriter
  /** Everything of the answer but its results. */
  readonly envelope: {
    model: z.infer<typeof ModelReference>
    chain: { base: string; tip: string; joints: string[]; types: ('revolute' | 'continuous' | 'prismatic')[] }
    units: SiReader['units']
    characteristicLength: number
    warnings?: ReturnType<typeof touchingFindings>
  }
}

/** A pose of a question as a transform of 12 numbers, in m. */
export function readPose(read: SiReader, pose: PoseQuestion, pointer: string): Float64Array {
  return transformOfPose(read.list(pose.position, POSITION_KINDS, `${pointer}/position`, 'a position'), pose.quaternion)
}

/** Loads the chain and brings the common fields into SI. What is wrong with the numbers waits in `read` until its finish(). */
export async function begin(caller: Caller, at: Pick<Located, 'model' | 'revision'>, question: CommonQuestion): Promise<Begun> {
  const revision = await loadRevision(at.revision.id)
  const chain = chainOf(revision, question.chain ?? {})
  const read = new SiReader(fullUnits(question.units))
  const kinds = jointKinds(chain)
  const characteristicLength = read.number(question.characteristicLength ?? 1, null, '/characteristicLength')
  const configurations: number[][] = []
  const asked = question.configurations ?? []
  await inSlices(asked.length, (i) => {
    configurations.push(read.list(asked[i]!, kinds, `/configurations/${i}`, 'the chain'))
  })
  const warnings = touchingFindings(revision.description, revision.findings, chain.base, chain.tip)
  return {
    chain,
    work: createWorkspace(chain),
    kinds,
    configurations,
    tipFromTool: question.tool && readPose(read, question.tool, '/tool'),
    characteristicLength,
    read,
    write: new SiWriter(read.units),
    envelope: {
      model: {
        team: caller.team.slug,
        model: at.model.model.slug,
        revision: at.revision.number,
        status: at.revision.status,
        fingerprint: at.revision.fingerprint,
      },
      chain: { base: chain.base, tip: chain.tip, joints: chain.joints.map(({ name }) => name), types: chain.joints.map(({ type }) => type) },
      units: read.units,
      characteristicLength,
      ...(warnings.length === 0 ? {} : { warnings }),
    },
  }
}

/** The task of a question; all six components in the base frame when left out. */
export const taskOf = (task: { components?: readonly TwistComponent[] | undefined; frame?: TaskFrame | undefined } | undefined): Task =>
  createTask(task?.components, task?.frame)

/** What one JSON number takes in an answer, at the most: sign, 17 digits, point, exponent and comma. */
const BYTES_A_NUMBER = 25
const MOST_ANSWER_BYTES = 64 * 1024 * 1024
/** Names, brackets and words beside the numbers of one result. */
const BYTES_A_RESULT = 400

/** Fails with answer-too-large when results of this many numbers would exceed 64 MiB. */
export function checkAnswerSize(results: number, numbersEach: number, what = 'configurations'): void {
  const bytes = results * (BYTES_A_RESULT + numbersEach * BYTES_A_NUMBER)
  if (bytes <= MOST_ANSWER_BYTES) return
  const most = Math.floor(MOST_ANSWER_BYTES / (BYTES_A_RESULT + numbersEach * BYTES_A_NUMBER))
  fail('answer-too-large', `The answer was estimated at ${Math.ceil(bytes / 1024 / 1024)} MiB, and 64 MiB is the most. Send at most ${most} ${what} at once, or name the fields you need in "include".`)
}
