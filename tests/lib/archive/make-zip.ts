import { deflateRawSync } from 'node:zlib'
import { checksumOf } from '@/lib/archive/checksum'

/** One entry, and what a hostile writer would say of it. */
export interface ZipEntry {
  readonly name: string
  readonly data?: string | Uint8Array
  /** 8 (deflate) when left out. */
  readonly method?: number
  readonly flags?: number
  /** As Unix writes type and permissions. */
  readonly mode?: number
  readonly attributes?: number
  /** What the directory says instead of what is so. */
  readonly directory?: Partial<{ size: number; packedSize: number; checksum: number; headerAt: number }>
  /** What the local header says instead. */
  readonly local?: Partial<{ name: string; size: number; method: number; checksum: number; flags: number }>
  /** Sizes and checksum follow behind the data. */
  readonly descriptor?: true
  /** Packed bytes as they stand. */
  readonly packed?: Uint8Array
}

export interface ZipOptions {
  readonly comment?: string
  /** Stands before the first and behind the last byte. */
  readonly before?: Uint8Array
  readonly after?: Uint8Array
  /** How many entries the end record says there are. */
  readonly count?: number
  readonly zip64?: true
}

const u16 = (value: number) => Buffer.from([value & 0xff, value >>> 8])
function u32(value: number): Buffer {
  const bytes = Buffer.alloc(4)
  bytes.writeUInt32LE(value >>> 0)
  return bytes
}
function u64(value: number): Buffer {
  const bytes = Buffer.alloc(8)
  bytes.writeBigUInt64LE(BigInt(value))
  return bytes
}

const UTF8 = 0x800
const ELSEWHERE = 0xffffffff

/** A zip archive byte by byte (APPNOTE.TXT, version 6.3), with every field open to lies. Shares no code with the reader but CRC-32. */
export function makeZip(entries: readonly ZipEntry[], { comment = '', before = Buffer.alloc(0), after = Buffer.alloc(0), count, zip64 }: ZipOptions = {}): Buffer {
  const pieces: Uint8Array[] = [before]
  const directory: Buffer[] = []
  let at = before.length
  for (const { name, data = '', method = 8, flags = 0, mode = 0, attributes = 0, directory: lies = {}, local = {}, descriptor, packed: given } of entries) {
    const bytes = Buffer.from(data as string)
    const packed = given ?? (method === 8 ? deflateRawSync(bytes) : bytes)
    const size = bytes.length
    const checksum = checksumOf(bytes)
    const bits = flags | UTF8 | (descriptor ? 8 : 0)
    const inHeader = (value: number) => (descriptor ? 0 : value)
    const localName = Buffer.from(local.name ?? name)
    const head = Buffer.concat([
      u32(0x04034b50), u16(20), u16(local.flags ?? bits), u16(local.method ?? method), u32(0), u32(local.checksum ?? inHeader(checksum)),
      u32(inHeader(packed.length)), u32(local.size ?? inHeader(size)), u16(localName.length), u16(0), localName,
    ])
    const tail = descriptor ? Buffer.concat([u32(0x08074b50), u32(checksum), u32(packed.length), u32(size)]) : Buffer.alloc(0)
    const extra = zip64 ? Buffer.concat([u16(1), u16(16), u64(size), u64(packed.length)]) : Buffer.alloc(0)
    directory.push(
      Buffer.concat([
        u32(0x02014b50), u16(3 * 256 + 20), u16(20), u16(bits), u16(method), u32(0), u32(lies.checksum ?? checksum),
        u32(zip64 ? ELSEWHERE : (lies.packedSize ?? packed.length)), u32(zip64 ? ELSEWHERE : (lies.size ?? size)),
        u16(Buffer.byteLength(name)), u16(extra.length), u16(0), u16(0), u16(0), u32(((mode << 16) | attributes) >>> 0), u32(lies.headerAt ?? at), Buffer.from(name), extra,
      ]),
    )
    pieces.push(head, packed, tail)
    at += head.length + packed.length + tail.length
  }
  const listing = Buffer.concat(directory)
  const total = count ?? entries.length
  const endAt = at + listing.length
  const zip64End = zip64
    ? Buffer.concat([u32(0x06064b50), u64(44), u16(45), u16(45), u32(0), u32(0), u64(total), u64(total), u64(listing.length), u64(at), u32(0x07064b50), u32(0), u64(endAt), u32(1)])
    : Buffer.alloc(0)
  const end = Buffer.concat([
    u32(0x06054b50), u16(0), u16(0), u16(zip64 ? 0xffff : total), u16(zip64 ? 0xffff : total), u32(zip64 ? ELSEWHERE : listing.length), u32(zip64 ? ELSEWHERE : at),
    u16(Buffer.byteLength(comment)), Buffer.from(comment),
  ])
  return Buffer.concat([...pieces, listing, zip64End, end, after])
}

/** A robot of two links, the upper of which has a mesh. */
export const robotText = (mesh = 'package://arm/meshes/base.stl', name = 'arm'): string =>
  `<robot name="${name}"><link name="base"><visual><geometry><mesh filename="${mesh}"/></geometry></visual></link><link name="upper"/>` +
  '<joint name="turn" type="revolute"><parent link="base"/><child link="upper"/><axis xyz="0 0 1"/><limit lower="-1" upper="1" effort="1" velocity="1"/></joint></robot>'

/** An archive as a supplier would send it: a description and its mesh, and what else is given. */
export const armEntries = (...more: ZipEntry[]): ZipEntry[] => [
  { name: 'arm/' , method: 0 },
  { name: 'arm/urdf/arm.urdf', data: robotText() },
  { name: 'arm/meshes/base.stl', data: 'solid base\nendsolid base\n' },
  ...more,
]
