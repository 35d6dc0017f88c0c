import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'

const CSS = readFileSync(path.join(import.meta.dirname, '../../../app/globals.css'), 'utf8')
const THEMES = ['paper', 'night shift'] as const

function colour(token: string, theme: number): string {
  const found = new RegExp(`--${token}: light-dark\\((#[0-9a-f]{6}), (#[0-9a-f]{6})\\)`).exec(CSS)
  return found![theme + 1]!
}

/** Relative luminance, WCAG 2.2. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r! + 0.7152 * g! + 0.0722 * b!
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x)
  return (light! + 0.05) / (dark! + 0.05)
}

describe.each(THEMES.map((name, theme) => ({ name, theme })))('the colours of $name', ({ theme }) => {
  const grounds = ['page', 'sheet', 'wash']

  it.each(['ink', 'soft', 'blue', 'amber', 'verm', 'green'])('give %s at least 4.5 to 1 on page, sheet and wash', (token) => {
    for (const ground of grounds) expect(contrast(colour(token, theme), colour(ground, theme))).toBeGreaterThanOrEqual(4.5)
  })

  it('give the words on a blue button at least 4.5 to 1', () => {
    expect(contrast(colour('sheet', theme), colour('blue', theme))).toBeGreaterThanOrEqual(4.5)
  })
})
