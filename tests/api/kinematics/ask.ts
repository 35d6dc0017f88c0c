import type { Response } from 'supertest'
import type { z } from 'zod'
import type { ForwardKinematicsAnswer, InverseKinematicsAnswer, JacobianAnswer, JointRatesAnswer, NullSpaceAnswer } from '@/lib/contract/kinematic-answers'
import { type Headers, send } from '../send'
import { asKey } from '../support/callers'

interface Answers {
  'forward-kinematics': z.infer<typeof ForwardKinematicsAnswer>
  jacobian: z.infer<typeof JacobianAnswer>
  'null-space': z.infer<typeof NullSpaceAnswer>
  'joint-rates': z.infer<typeof JointRatesAnswer>
  'inverse-kinematics': z.infer<typeof InverseKinematicsAnswer>
}
export type Question = keyof Answers
/** The questions about configurations. */
export const ABOUT_CONFIGURATIONS = ['forward-kinematics', 'jacobian', 'null-space', 'joint-rates'] as const satisfies readonly Question[]
export const QUESTIONS: readonly Question[] = [...ABOUT_CONFIGURATIONS, 'inverse-kinematics']

const pathOf = (model: string, question: string) => `/teams/tarnholm/models/${model.includes('/') ? model.replace('/', '/revisions/') : `${model}/revisions/1`}/${question}`

/** Asks a question of a model of tarnholm ("slug", which is its revision 1, or "slug/revision") and gives whatever came back. */
export const ask = (question: string, model: string, json: object, headers: Headers = {}): Promise<Response> =>
  send({ method: 'POST', path: pathOf(model, question), headers: { ...asKey(), ...headers }, json })

/** The answer to a question that must have one. */
export async function answerTo<Q extends Question>(question: Q, model: string, json: object): Promise<Answers[Q]> {
  const { status, body, text } = await ask(question, model, json)
  if (status !== 200) throw new Error(`${status} ${text}`)
  return body as Answers[Q]
}

/** The results alone. */
export const resultsOf = async <Q extends Question>(question: Q, model: string, json: object): Promise<Answers[Q]['results']> => (await answerTo(question, model, json)).results

/** The one result. */
export async function resultOf<Q extends Question>(question: Q, model: string, json: object): Promise<Answers[Q]['results'][number]> {
  const [result] = await resultsOf(question, model, json)
  return result!
}
