import type { Secondary } from '@/lib/contract/kinematic-quantities'
import type { Objective } from '@/lib/kinematics/objectives'
import type { Begun } from './begin'

/** The secondary objectives of a question, postures in SI. */
export const readObjectives = (secondary: readonly Secondary[] | undefined, { read, kinds }: Pick<Begun, 'read' | 'kinds'>): Objective[] =>
  (secondary ?? []).map((objective, i) => {
    const pointer = `/secondary/${i}`
    const gain = read.number(objective.gain, null, `${pointer}/gain`)
    if (objective.objective !== 'posture') return { objective: objective.objective, gain }
    return { objective: 'posture', gain, posture: read.list(objective.posture, kinds, `${pointer}/posture`, 'the chain') }
  })
