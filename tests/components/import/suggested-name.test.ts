import { describe, expect, it } from 'vitest'
import { fileSizeText } from '@/components/import/file-size'
import { lineOfAnchor } from '@/components/import/place'
import { suggestedName } from '@/components/import/suggested-name'

describe('suggestedName', () => {
  it.each([
    ['skerry_7', 'x.urdf', 'Skerry 7'],
    ['', 'fulmar_6.urdf', 'Fulmar 6'],
    ['   ', 'arm.URDF', 'Arm'],
    ['Größe', 'x.urdf', 'Größe'],
  ])('reads %j of %j as %j', (robot, file, name) => expect(suggestedName(robot, file)).toBe(name))

  it('is never longer than a name may be', () => expect(suggestedName('x'.repeat(500), '')).toHaveLength(120))
})

describe('fileSizeText', () => {
  it('has a unit that fits', () => expect([718, 20_480, 8_388_608].map(fileSizeText)).toEqual(['718 bytes', '20 KiB', '8.0 MiB']))
})

describe('lineOfAnchor', () => {
  it('reads a line, and nothing else', () => {
    expect(['#L112', '#L0', '#L', '#l5', '', '#L5x'].map(lineOfAnchor)).toEqual([112, null, null, null, null, null])
  })
})
