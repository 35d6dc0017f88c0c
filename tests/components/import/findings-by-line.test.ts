import { describe, expect, it } from 'vitest'
import { countFindings, findingCountText, findingOfLine, severityByLine } from '@/components/import/findings-by-line'
import type { Finding } from '@/lib/contract/description'

const finding = (line: number, severity: Finding['severity']): Finding => ({ rule: 'r', severity, message: 'm', remedy: 'r', line, column: 1 })

describe('severityByLine', () => {
  it('marks a line with the gravest of its findings, whatever their order', () => {
    const marks = severityByLine([finding(3, 'note'), finding(3, 'error'), finding(3, 'warning'), finding(4, 'note')])
    expect([...marks]).toEqual([[3, 'error'], [4, 'note']])
  })
})

describe('findingCountText', () => {
  it('counts in words, one and many apart', () => {
    expect(findingCountText(countFindings([finding(1, 'warning'), finding(2, 'note'), finding(2, 'note')]))).toBe('0 errors · 1 warning · 2 notes')
  })
})

describe('findingOfLine', () => {
  it('chooses the first finding of a line, and only the line where there is none', () => {
    const findings = [finding(3, 'note'), { ...finding(4, 'error'), column: 9 }, finding(4, 'note')]
    expect(findingOfLine(findings, 4)).toEqual({ index: 1, place: { line: 4, column: 9 } })
    expect(findingOfLine(findings, 5)).toEqual({ index: null, place: { line: 5, column: 1 } })
  })
})
