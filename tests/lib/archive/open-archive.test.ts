import { deflateRawSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'
import { openArchive } from '@/lib/archive/open-archive'
import type { RuleId } from '@/lib/urdf/rules'
import { ARCHIVE_RULES } from '@/lib/urdf/rules-of-archive'
import { armEntries, makeZip, robotText, type ZipEntry } from './make-zip'

const open = (bytes: Uint8Array, entry?: string) => openArchive(bytes, entry)
const MEBIBYTE = 1024 * 1024
const arm = (...more: ZipEntry[]) => makeZip(armEntries(...more))
const noise = (length: number) => Uint8Array.from({ length }, (_, i) => (Math.imul(i + 1, 2654435761) >>> 13) & 0xff)

/** For each rule archives that break it and no other. */
const BROKEN: readonly (readonly [RuleId, string, () => Uint8Array])[] = [
  ['archive-malformed', 'no end', () => arm().subarray(0, -30)],
  ['archive-malformed', 'half of it', () => arm().subarray(0, 300)],
  ['archive-malformed', 'bytes behind its end', () => makeZip(armEntries(), { after: Buffer.from('tail') })],
  ['archive-malformed', 'bytes in front that move every offset', () => Buffer.concat([Buffer.from('PK\x03\x04 in front'), arm()])],
  ['archive-malformed', 'fewer entries counted than listed', () => makeZip(armEntries(), { count: 2 })],
  ['archive-malformed', 'more entries counted than listed', () => makeZip(armEntries(), { count: 4 })],
  ['archive-malformed', 'two entries over one another', () => arm({ name: 'a.stl', data: 'a', directory: { headerAt: 0 } })],
  ['archive-malformed', 'a checksum that is wrong everywhere', () => arm({ name: 'a.stl', data: 'a', directory: { checksum: 7 }, local: { checksum: 7 } })],
  ['archive-malformed', 'data that are not deflated', () => arm({ name: 'a.stl', data: 'abcdef', packed: Buffer.from('\xff\xff\xff', 'latin1') })],
  ['archive-malformed', 'bytes behind the deflated data', () => arm({ name: 'a.stl', data: 'abcdef', packed: Buffer.concat([deflateRawSync('abcdef'), Buffer.from('more')]) })],
  ['archive-headers-differ', 'another name', () => arm({ name: 'a.stl', data: 'a', local: { name: 'b.stl' } })],
  ['archive-headers-differ', 'another size', () => arm({ name: 'a.stl', data: 'a', local: { size: 2 } })],
  ['archive-headers-differ', 'another packing', () => arm({ name: 'a.stl', data: 'a', local: { method: 0 } })],
  ['archive-headers-differ', 'another checksum', () => arm({ name: 'a.stl', data: 'a', local: { checksum: 7 } })],
  ['archive-headers-differ', 'encryption in one of them only', () => arm({ name: 'a.stl', data: 'a', local: { flags: 0x801 } })],
  ['archive-headers-differ', 'a bomb that says it is small', () => arm({ name: 'a.stl', data: new Uint8Array(64 * MEBIBYTE), directory: { size: 9 }, local: { size: 9 } })],
  ['archive-headers-differ', 'a size that is not reached', () => arm({ name: 'a.stl', data: 'abc', directory: { size: 9 }, local: { size: 9 } })],
  ['archive-path-unsafe', 'a way up', () => arm({ name: '../../etc/base.stl' })],
  ['archive-path-unsafe', 'a way up in the middle', () => arm({ name: 'arm/../../base.stl' })],
  ['archive-path-unsafe', 'a way up with backslashes', () => arm({ name: 'arm\\..\\..\\base.stl' })],
  ['archive-path-unsafe', 'an absolute path', () => arm({ name: '/etc/base.stl' })],
  ['archive-path-unsafe', 'an absolute path with a backslash', () => arm({ name: '\\srv\\base.stl' })],
  ['archive-path-unsafe', 'a drive', () => arm({ name: 'C:/base.stl' })],
  ['archive-path-unsafe', 'a NUL', () => arm({ name: 'base.stl\0.txt' })],
  ['archive-path-unsafe', 'a line break', () => arm({ name: 'base\n.stl' })],
  ['archive-path-unsafe', 'no name', () => arm({ name: '' })],
  ['archive-path-unsafe', 'a name of 1025 characters', () => arm({ name: `${'x'.repeat(1021)}.stl` })],
  ['archive-link', 'a symbolic link', () => arm({ name: 'a.stl', data: '/etc/hostname', mode: 0o120777 })],
  ['archive-link', 'a device', () => arm({ name: 'a.stl', mode: 0o020666 })],
  ['archive-link', 'a reparse point', () => arm({ name: 'a.stl', attributes: 0x400 })],
  ['archive-encrypted', 'an encrypted entry', () => arm({ name: 'a.stl', data: 'a', flags: 1 })],
  ['archive-encrypted', 'strong encryption', () => arm({ name: 'a.stl', data: 'a', flags: 0x41 })],
  ['archive-packing-unknown', 'LZMA', () => arm({ name: 'a.stl', data: 'a', method: 14 })],
  ['archive-too-many-entries', '2001 entries', () => makeZip([...armEntries(), ...Array.from({ length: 1998 }, (_, i) => ({ name: `m/${i}.stl` }))])],
  ['archive-too-large', 'five meshes of 60 MiB by the directory', () => arm(...Array.from({ length: 5 }, (_, i) => ({ name: `${i}.stl`, data: 'a', directory: { size: 60 * MEBIBYTE }, local: { size: 60 * MEBIBYTE } })))],
  ['archive-ratio', 'zeros', () => arm({ name: 'a.stl', data: new Uint8Array(MEBIBYTE) })],
  ['archive-nested', 'an archive by its name', () => arm({ name: 'meshes.zip', data: 'a' })],
  ['archive-nested', 'an archive by its bytes', () => arm({ name: 'meshes.bin', data: arm() })],
  ['archive-nested', 'a gzip file by its bytes', () => arm({ name: 'scan.stl', data: Buffer.from('1f8b0800', 'hex') })],
  ['archive-nested', 'a tar file by its bytes', () => arm({ name: 'scan.stl', data: `${'\0\x01'.repeat(128)}\0ustar${'ab'.repeat(30)}` })],
  ['archive-name-twice', 'one name twice', () => arm({ name: 'arm/meshes/base.stl', data: 'other' })],
  ['archive-name-twice', 'names that differ in case', () => arm({ name: 'arm/Meshes/BASE.stl', data: 'other' })],
  ['archive-name-twice', 'names that differ in their separators', () => arm({ name: 'arm\\meshes\\base.stl', data: 'other' })],
  ['archive-name-twice', 'names that differ in how an accent is written', () => arm({ name: 'b\u00e9.stl' }, { name: 'be\u0301.stl' })],
  ['archive-name-twice', 'a file with the name of a folder', () => arm({ name: 'arm/meshes' })],
  ['archive-without-urdf', 'meshes only', () => makeZip([{ name: 'base.stl', data: 'solid' }])],
  ['archive-without-urdf', 'XML of another kind', () => makeZip([{ name: 'package.xml', data: '<?xml version="1.0"?><!-- <robot> --><package/>' }])],
  ['archive-without-urdf', 'nothing', () => makeZip([])],
  ['archive-several-urdfs', 'two descriptions', () => arm({ name: 'other.urdf', data: robotText() })],
]

describe('an archive', () => {
  it.each(BROKEN)('is refused by %s for %s', async (rule, _what, make) => {
    const { description, files, findings } = await open(make())
    expect([description, files, findings.map((finding) => finding.rule)]).toEqual([null, [], [rule]])
    expect(findings[0]!.message).toMatch(/^[A-Z"].*\.$/s)
  })

  it('has a broken one for every rule that an archive alone can break', () => {
    const broken = new Set<string>(BROKEN.map(([rule]) => rule))
    expect(Object.keys(ARCHIVE_RULES).filter((rule) => !broken.has(rule))).toEqual(['archive-entry-missing', 'archive-file-unused'])
  })

  it.each([
    ['as it comes', arm()],
    ['with a comment', makeZip(armEntries(), { comment: 'Skerry 7, as built' })],
    ['with sizes behind the data', makeZip(armEntries().map((entry) => ({ ...entry, descriptor: true as const })))],
    ['in the format of zip64', makeZip(armEntries(), { zip64: true })],
    ['stored without compression', makeZip(armEntries().map((entry) => ({ ...entry, method: 0 })))],
    ['with backslashes', makeZip(armEntries().map((entry) => ({ ...entry, name: entry.name.replaceAll('/', '\\') })))],
    ['with a dot in front', makeZip(armEntries().map((entry) => ({ ...entry, name: `./${entry.name}` })))],
    ['with what some systems leave in it', arm({ name: '__MACOSX/arm/urdf/._arm.urdf', data: 'x' }, { name: 'arm/.DS_Store', data: 'y' })],
    ['with 2000 entries', makeZip([...armEntries(), ...Array.from({ length: 1997 }, (_, i) => ({ name: `m/${i}/` , method: 0 }))])],
  ])('is read %s', async (_how, bytes) => {
    const { description, descriptions, files, findings } = await open(bytes)
    expect([description?.path, Buffer.from(description!.bytes).toString(), descriptions, findings]).toEqual(['arm/urdf/arm.urdf', robotText(), ['arm/urdf/arm.urdf'], []])
    expect(files.map(({ path, mediaType, bytes: mesh }) => [path, mediaType, Buffer.from(mesh).toString()])).toEqual([['arm/meshes/base.stl', 'model/stl', 'solid base\nendsolid base\n']])
  })

  it('unpacks what does not get smaller as well as what does', async () => {
    const data = noise(300_000)
    const { files } = await open(arm({ name: 'a.glb', data }, { name: 'b.png', data, method: 0 }))
    expect(files.map(({ path, bytes }) => [path, Buffer.compare(bytes, data)])).toEqual([['a.glb', 0], ['arm/meshes/base.stl', expect.any(Number)], ['b.png', 0]])
  })

  it('offers a choice of several descriptions and reads the one that is chosen', async () => {
    const bytes = arm({ name: 'left.urdf', data: robotText('base.stl', 'left') })
    expect(await open(bytes)).toMatchObject({ description: null, descriptions: ['arm/urdf/arm.urdf', 'left.urdf'] })
    const { description, findings } = await open(bytes, 'left.urdf')
    expect(Buffer.from(description!.bytes).toString()).toBe(robotText('base.stl', 'left'))
    expect(findings).toMatchObject([{ rule: 'archive-file-unused', severity: 'note', message: 'The file "arm/urdf/arm.urdf" in the archive is not used.' }])
  })

  it('names the descriptions that there are when another one is asked for', async () => {
    const { description, descriptions, findings } = await open(arm(), 'Arm.urdf')
    expect([description, descriptions, findings.map(({ rule }) => rule)]).toEqual([null, ['arm/urdf/arm.urdf'], ['archive-entry-missing']])
    expect(findings[0]!.message).toContain('"arm/urdf/arm.urdf"')
  })

  it('takes XML that begins with a robot where nothing ends in .urdf', async () => {
    const xml = `\uFEFF<?xml version="1.0"?>\n${'<!-- a --> '.repeat(2000)}${robotText()}`
    const { description } = await open(makeZip([{ name: 'package.xml', data: '<package/>' }, { name: 'arm.xml', data: xml }]))
    expect(description?.path).toBe('arm.xml')
  })

  it('says once which files are not used', async () => {
    const { findings } = await open(arm({ name: 'README.md', data: 'x' }, { name: 'launch/arm.launch', data: 'y' }))
    expect(findings.map(({ rule, message }) => [rule, message])).toEqual([['archive-file-unused', '2 files in the archive, first "README.md", are not used.']])
  })

  it('is refused or read and never fails, whichever byte of it is changed', async () => {
    const bytes = makeZip(armEntries(), { comment: 'c' })
    const rules = new Set<string>()
    for (let at = 0; at < bytes.length; at++) {
      for (const flip of [0x01, 0x80, 0xff]) {
        const changed = Buffer.from(bytes)
        changed[at] = changed[at]! ^ flip
        const { description, findings } = await open(changed)
        if (description === null) rules.add(findings[0]!.rule)
        else expect(Buffer.from(description.bytes).toString()).toBe(robotText())
      }
    }
    expect([...rules]).toEqual(expect.arrayContaining(['archive-malformed', 'archive-headers-differ', 'archive-encrypted', 'archive-packing-unknown']))
  })
})
