import { describe, expect, it } from 'vitest'
import { archivedText } from '@/components/import/archived-text'
import { armEntries, makeZip, robotText } from '../../lib/archive/make-zip'

describe('archivedText', () => {
  it.each([
    ['as it comes', makeZip(armEntries())],
    ['with backslashes', makeZip(armEntries().map((entry) => ({ ...entry, name: entry.name.replaceAll('/', '\\') })))],
    ['with a dot in front', makeZip(armEntries().map((entry) => ({ ...entry, name: `./${entry.name}` })))],
    ['with sizes behind the data', makeZip(armEntries().map((entry) => ({ ...entry, descriptor: true as const })))],
  ])('finds the description of an archive %s under the path that the service names', (_how, bytes) => {
    expect(archivedText(bytes, 'arm/urdf/arm.urdf')).toBe(robotText())
  })

  it('is null where the archive has no such file', () => {
    expect(archivedText(makeZip(armEntries()), 'other.urdf')).toBeNull()
  })
})
