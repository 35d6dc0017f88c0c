import { beforeEach, describe, expect, it, vi } from 'vitest'
import { isSetUp } from '@/lib/teams/is-set-up'
import { announceSetup, checkSetupCode } from '@/lib/teams/setup-code'

vi.mock('@/lib/teams/is-set-up', () => ({ isSetUp: vi.fn(async () => false) }))

beforeEach(() => {
  delete (globalThis as { elbowroomSetup?: unknown }).elbowroomSetup
  vi.mocked(isSetUp).mockResolvedValue(false)
})

describe('the setup code', () => {
  it('is one for the life of the process, in four groups without letters that look alike', async () => {
    const code = await announceSetup()
    expect(code).toMatch(/^[2-9A-HJ-NP-Z]{4}(-[2-9A-HJ-NP-Z]{4}){3}$/)
    expect(await announceSetup()).toBe(code)
  })

  it('is taken as people type it', async () => {
    const code = (await announceSetup())!
    for (const typed of [code, code.toLowerCase(), code.replaceAll('-', ''), ` ${code.replaceAll('-', ' ')} `]) expect(checkSetupCode(typed)).toBe('right')
  })

  it('closes after twenty wrong tries, the right one included', async () => {
    const code = (await announceSetup())!
    for (let tries = 0; tries < 20; tries++) expect(checkSetupCode(tries % 2 === 0 ? '' : `${code}2`.slice(1))).toBe('wrong')
    expect(checkSetupCode(code)).toBe('closed')
  })

  it('does not exist on an installation that is set up, and opens nothing before it was made', async () => {
    expect(checkSetupCode('2222-2222-2222-2222')).toBe('closed')
    vi.mocked(isSetUp).mockResolvedValue(true)
    expect(await announceSetup()).toBeNull()
  })
})
