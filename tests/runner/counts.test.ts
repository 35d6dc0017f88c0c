import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { countCheck, countPlaywright, countVitest } from './counts.mjs'

const folder = mkdtempSync(path.join(tmpdir(), 'elbowroom-counts-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

function report(content: unknown): string {
  const file = path.join(folder, 'report.json')
  writeFileSync(file, typeof content === 'string' ? content : JSON.stringify(content))
  return file
}

const vitest = (passed: number, total: number, testResults: unknown[] = []) => ({ numPassedTests: passed, numTotalTests: total, testResults })
const playwright = (stats: object, errors: unknown[] = []) => ({ stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 0, ...stats }, errors })

describe('the sum of a test run', () => {
  it('counts a check by its exit code', () => {
    expect([countCheck(0), countCheck(2)]).toEqual([{ passed: 1, failed: 0 }, { passed: 0, failed: 1 }])
  })

  it.each([
    ['passed tests', vitest(3, 3), 0, { passed: 3, failed: 0 }],
    ['failed and skipped tests as failed', vitest(3, 5), 1, { passed: 3, failed: 2 }],
    ['a file that could not be loaded', vitest(3, 3, [{ status: 'failed', assertionResults: [] }]), 1, { passed: 3, failed: 1 }],
    ['a bad end without a failed test', vitest(3, 3), 1, { passed: 3, failed: 1 }],
    ['a run of nothing', vitest(0, 0), 0, { passed: 0, failed: 1 }],
    ['a report that is no report', 'cut off {', 0, { passed: 0, failed: 1 }],
  ])('counts of Vitest %s', (_what, content, exitCode, counts) => {
    expect(countVitest(report(content), exitCode)).toEqual(counts)
  })

  it.each([
    ['passed tests', playwright({ expected: 4 }), 0, { passed: 4, failed: 0 }],
    ['flaky and skipped tests as failed', playwright({ expected: 4, flaky: 1, skipped: 1, unexpected: 1 }), 1, { passed: 4, failed: 3 }],
    ['errors outside a test', playwright({ expected: 4 }, [{ message: 'no server' }]), 1, { passed: 4, failed: 1 }],
    ['a run of nothing', playwright({}), 0, { passed: 0, failed: 1 }],
  ])('counts of Playwright %s', (_what, content, exitCode, counts) => {
    expect(countPlaywright(report(content), exitCode)).toEqual(counts)
  })

  it('counts a runner that left no report as one failure', () => {
    expect(countVitest(path.join(folder, 'none.json'), 0)).toEqual({ passed: 0, failed: 1 })
  })
})
