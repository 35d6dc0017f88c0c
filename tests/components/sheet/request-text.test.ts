import { execFileSync } from 'node:child_process'
import { describe, expect, it } from 'vitest'
import { forwardKinematicsCurl } from '@/components/sheet/request-text'
import type { ChainJoint } from '@/lib/kinematics/chain'
import { ForwardKinematicsQuestion } from '@/lib/contract/kinematic-questions'

const JOINTS: ChainJoint[] = [{ name: 'a', type: 'revolute', lower: null, upper: null, rate: null }]

/** What the shell would hand to curl, one argument an entry. */
function argumentsOf(command: string): string[] {
  const script = `curl() { printf '%s\\0' "$@"; }\nELBOWROOM_KEY=secret\n${command}`
  return execFileSync('bash', ['-c', script], { encoding: 'utf8' }).split('\0').slice(0, -1)
}

describe('forwardKinematicsCurl', () => {
  const question = { site: 'https://x.example', path: '/teams/t/models/m/revisions/2', fingerprint: 'f'.repeat(64), joints: JOINTS, q: [Math.PI / 2], units: { length: 'mm', angle: 'deg' } } as const

  it('asks a question that the contract accepts, with the values drawn', () => {
    const sent = argumentsOf(forwardKinematicsCurl(question))
    expect(sent[0]).toBe('https://x.example/api/v1/teams/t/models/m/revisions/2/forward-kinematics')
    expect(sent).toContain('Authorization: Bearer secret')
    expect(sent).toContain(`If-Match: "${'f'.repeat(64)}"`)
    const body = ForwardKinematicsQuestion.parse(JSON.parse(sent.at(-1)!))
    expect(body).toEqual({ units: { length: 'mm', angle: 'deg' }, configurations: [[90]] })
  })

  it('survives link names that a shell would read', () => {
    const chain = { base: `it's "$HOME" \`ls\``, tip: 'a\\b' }
    const sent = argumentsOf(forwardKinematicsCurl({ ...question, chain }))
    expect(JSON.parse(sent.at(-1)!).chain).toEqual(chain)
  })
})
