import type { KeyboardEvent } from 'react'
import { describe, expect, it } from 'vitest'
import { rowToFocus } from '@/components/register/move-focus'

const press = (key: string, index: string | undefined, more = {}) =>
  ({ key, target: { dataset: { index } }, altKey: false, ctrlKey: false, metaKey: false, ...more }) as unknown as KeyboardEvent<HTMLElement>

describe('rowToFocus', () => {
  it.each([
    ['ArrowDown', 5],
    ['ArrowUp', 3],
    ['PageDown', 14],
    ['Home', 0],
    ['End', 99],
  ])('moves from row 4 of 100 with %s to row %d', (key, row) => expect(rowToFocus(press(key, '4'), 100)).toBe(row))

  it('stays within the list', () => {
    expect(rowToFocus(press('ArrowUp', '0'), 3)).toBe(0)
    expect(rowToFocus(press('PageDown', '2'), 3)).toBe(2)
  })

  it('leaves other keys, shortcuts and other elements alone', () => {
    expect(rowToFocus(press('Enter', '1'), 3)).toBeNull()
    expect(rowToFocus(press('ArrowDown', '1', { ctrlKey: true }), 3)).toBeNull()
    expect(rowToFocus(press('ArrowDown', undefined), 3)).toBeNull()
  })
})
