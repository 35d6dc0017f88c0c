import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { ForwardKinematicsResult } from '@/lib/contract/kinematic-answers'
import { FORWARD_KINEMATICS_FIELDS } from '@/lib/contract/kinematic-questions'
import { fail } from '@/lib/errors'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { listViolations } from '@/lib/kinematics/within-limits'
import { begin, taskOf } from './begin'
import { includedFields, inOrder, pick } from './included'
import { chainOf, loadRevision } from './load-chain'
import { presentPose } from './present-pose'
import { withRecords } from './with-records'

/** A link beside the tip: its own chain, and where each of its joints stands in the main one. Fails with link-not-determined. */
function followLink(main: Chain, link: Chain, pointer: string) {
  const places = link.joints.map(({ name }) => main.joints.findIndex((joint) => joint.name === name))
  const missing = link.joints[places.indexOf(-1)]
  if (missing !== undefined) {
    const detail = `The pose of '${link.tip}' also depends on the joint '${missing.name}', which is not in chain.joints.`
    fail('link-not-determined', detail, { errors: [{ pointer, detail: `depends on '${missing.name}'` }] })
  }
  return { chain: link, work: createWorkspace(link), places }
}

const NUMBERS_A_POSE = 7
const NUMBERS_A_MATRIX = 16
/** Value and two bounds; the name takes as much as three more. */
const NUMBERS_A_VIOLATION = 6

/** Where the tool and further links are at each configuration, and whether the joints are within their limits. */
export const answerForwardKinematics: UseCase<'forwardKinematics'> = withRecords('forwardKinematics', async (caller, { at, body }) => {
  const { chain, work, configurations, tipFromTool, kinds, read, write, sizesOf, envelope } = await begin(caller, at, body)
  read.finish()
  const revision = await loadRevision(at.revision.id)
  const names = body.links ?? []
  names.forEach((name, i) => {
    if (!revision.description.links.some((link) => link.name === name)) {
      fail('invalid-request', `/links/${i} names no link of this revision.`, { errors: [{ pointer: `/links/${i}`, detail: 'is not a link of this revision' }] })
    }
  })
  const links = names.map((name, i) => followLink(chain, chainOf(revision, { base: chain.base, tip: name }), `/links/${i}`))

  const wanted = includedFields(FORWARD_KINEMATICS_FIELDS, body.include)
  if (body.links === undefined) wanted.delete('links')
  const withMatrix = body.matrices === true
  const poses = (wanted.has('pose') ? 1 : 0) + (wanted.has('links') ? links.length : 0)
  const violations = wanted.has('violations') ? NUMBERS_A_VIOLATION * kinds.length : 0

  function* steps(): Generator<z.infer<typeof ForwardKinematicsResult>, void> {
    for (const q of configurations) {
      forwardKinematics(chain, q, work, tipFromTool)
      const violations = listViolations(chain, q)
      yield pick<z.infer<typeof ForwardKinematicsResult>>(wanted, {
        pose: () => presentPose(work.baseFromTool, write, withMatrix),
        links: () =>
          links.map(({ chain: link, work: linkWork, places }) => {
            forwardKinematics(link, places.map((place) => q[place]!), linkWork)
            return { link: link.tip, pose: presentPose(linkWork.baseFromTip, write, withMatrix) }
          }),
        withinLimits: () => violations.length === 0,
        violations: () =>
          violations.map(({ joint, value, lower, upper }) => {
            const kind = kinds[chain.joints.findIndex(({ name }) => name === joint)]!
            return { joint, value: write.number(value, kind), lower: write.nullable(lower, kind), upper: write.nullable(upper, kind) }
          }),
      })
    }
  }
  const results = {
    count: configurations.length,
    of: 'configurations',
    fields: inOrder(FORWARD_KINEMATICS_FIELDS, wanted),
    sizes: sizesOf(taskOf(undefined), { links: links.length, matrices: withMatrix }),
    numbersEach: poses * (NUMBERS_A_POSE + (withMatrix ? NUMBERS_A_MATRIX : 0)) + violations,
    steps,
  } as const
  return { body: { ...envelope, results } }
})
