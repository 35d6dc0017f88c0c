import type { z } from 'zod'
import type { Caller } from '@/lib/access/caller'
import type { Located } from '@/lib/access/locate'
import type { ModelReference } from '@/lib/contract/kinematic-answers'
import type { PoseQuestion } from '@/lib/contract/kinematic-quantities'
import type { ForwardKinematicsQuestion } from '@/lib/contract/kinematic-questions'
import type { RecordSizes } from '@/lib/contract/record-columns'
import { inSlices } from '@/lib/in-slices'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace, type Workspace } from '@/lib/kinematics/create-workspace'
import { LINEAR_COMPONENTS, type Task, createTask, type TaskFrame, type TwistComponent } from '@/lib/kinematics/task'
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
  /** What the layout of a binary record depends on. */
  readonly sizesOf: (task: Task, more?: { readonly links?: number; readonly matrices?: boolean }) => RecordSizes
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
    sizesOf: ({ rows }, { links = 0, matrices = false } = {}) => {
      const linearComponents = rows.filter((row) => row < LINEAR_COMPONENTS).length
      return { joints: kinds.length, linearComponents, angularComponents: rows.length - linearComponents, links, matrices }
    },
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
