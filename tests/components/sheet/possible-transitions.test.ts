import { describe, expect, it } from 'vitest'
import { evidenceRefusal, fourEyesRefusal, possibleTransitions } from '@/app/teams/[team]/models/[model]/revisions/[revision]/possible-transitions'
import type { Role } from '@/lib/access/roles'

const caller = (role: Role, team: { fourEyes?: boolean; reviewRequired?: boolean; evidenceRequired?: boolean } = {}) => ({
  kind: 'person' as const,
  sessionId: 's',
  userId: 'u1',
  name: 'Ines',
  email: 'ines@tarnholm.example',
  role,
  team: { id: 't', slug: 't', name: 'T', fourEyes: true, reviewRequired: true, evidenceRequired: false, ...team },
})

describe('possibleTransitions', () => {
  it.each([
    ['reader', 'draft', []],
    ['engineer', 'draft', ['in-review', 'withdrawn']],
    ['engineer', 'in-review', ['draft', 'withdrawn']],
    ['approver', 'in-review', ['draft', 'released', 'withdrawn']],
    ['engineer', 'released', []],
    ['approver', 'released', ['withdrawn']],
    ['administrator', 'withdrawn', []],
  ] as const)('offers %s on a revision in %s: %j', (role, status, expected) => {
    expect(possibleTransitions(caller(role), status).toSorted()).toEqual([...expected])
  })

  it('offers to release a draft only where the team demands no review', () => {
    expect(possibleTransitions(caller('approver'), 'draft')).not.toContain('released')
    expect(possibleTransitions(caller('approver', { reviewRequired: false }), 'draft')).toContain('released')
  })
})

describe('fourEyesRefusal', () => {
  const history = [{ status: 'in-review' as const, by: 'Ines', at: '2026-12-01T10:00:00.000Z' }]

  it('says why importer and submitter cannot release', () => {
    expect(fourEyesRefusal(caller('approver'), 'u1', [])).toContain('imported')
    expect(fourEyesRefusal(caller('approver'), 'u2', history)).toContain('submitted')
  })

  it('is silent for another person, and where the team does not ask for four eyes', () => {
    expect(fourEyesRefusal({ ...caller('approver'), name: 'Tomas' }, 'u2', history)).toBeUndefined()
    expect(fourEyesRefusal(caller('approver', { fourEyes: false }), 'u1', history)).toBeUndefined()
  })
})

describe('evidenceRefusal', () => {
  it('says nothing where the team demands nothing, and where the newest reference poses pass', () => {
    expect(evidenceRefusal(caller('approver'), undefined)).toBeUndefined()
    expect(evidenceRefusal(caller('approver', { evidenceRequired: true }), { number: 2, passed: true })).toBeUndefined()
  })

  it('says what is missing where the team demands a pass', () => {
    expect(evidenceRefusal(caller('approver', { evidenceRequired: true }), undefined)).toContain('have to be stored')
    expect(evidenceRefusal(caller('approver', { evidenceRequired: true }), { number: 2, passed: false })).toContain('number 2')
  })
})
