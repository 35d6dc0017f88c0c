import { describe, expect, it } from 'vitest'
import { firstRequest } from '@/components/keys/first-request'
import { SCOPE_SENTENCES } from '@/components/keys/scope-sentences'
import { ForwardKinematicsQuestion } from '@/lib/contract/kinematic-questions'
import { SCOPES } from '@/lib/contract/key-operations'

const trial = { site: 'http://h', team: 't', key: 'elb_x', model: { path: '/teams/t/models/m/revisions/released', joints: 3 } }

describe('firstRequest', () => {
  it('asks a pose of a revision in force where the key computes', () => {
    const text = firstRequest({ ...trial, scopes: ['catalog:read', 'compute'] })!
    expect(text).toContain('/revisions/released/forward-kinematics')
    const body = /-d '([^']*)'/.exec(text)![1]!
    expect(ForwardKinematicsQuestion.parse(JSON.parse(body)).configurations).toEqual([[0, 0, 0]])
  })

  it('lists the models where the key only reads, and where nothing is released yet', () => {
    expect(firstRequest({ ...trial, scopes: ['catalog:read'] })).toContain("'http://h/api/v1/teams/t/models'")
    expect(firstRequest({ ...trial, model: null, scopes: ['compute', 'catalog:read'] })).toContain('/models')
  })

  it('offers nothing that the key could not do', () => {
    expect(firstRequest({ ...trial, model: null, scopes: ['compute'] })).toBeNull()
    expect(firstRequest({ ...trial, scopes: ['gateway'] })).toBeNull()
  })
})

describe('SCOPE_SENTENCES', () => {
  it('explains every scope', () => expect(Object.keys(SCOPE_SENTENCES).toSorted()).toEqual([...SCOPES].toSorted()))
})
