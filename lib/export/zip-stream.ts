import { Readable } from 'node:stream'
import { ZipFile } from 'yazl'
import { log } from '@/lib/log'
import { sha256Of } from '@/lib/storage/sha256-of'
import type { ExportFile } from './list-files'

/** The same model gives the same bytes: no time of today is in them, nor a time zone. The zip format knows no year before 1980. */
const ENTRY = { mtime: new Date(1980, 0, 1), mode: 0o100644, forceDosTimestamp: true } as const

/** These do not get smaller. */
const isPacked = (path: string): boolean => /\.(zip|png|jpe?g|webp)$/i.test(path)

interface Listed {
  readonly path: string
  readonly size: number
  readonly sha256: string
}

/** Bytes in pieces, so that each is deflated by itself and others have their turn. */
const PIECE_BYTES = 64 * 1024
function* piecesOf(bytes: Uint8Array): Generator<Uint8Array> {
  for (let at = 0; at < bytes.length; at += PIECE_BYTES) yield bytes.subarray(at, at + PIECE_BYTES)
}

/** An archive of these files and of a manifest behind them, written while it is sent. One file is in memory at a time. */
export function zipStream(files: readonly ExportFile[], what: { readonly team: string; readonly model: string }): ReadableStream<Uint8Array> {
  const zip = new ZipFile()
  const output = zip.outputStream as Readable
  const listed: Listed[] = []

  const fill = async (): Promise<void> => {
    for (const { path, read } of files) {
      if (output.destroyed) return
      const bytes = await read()
      if (bytes === undefined) continue
      listed.push({ path, size: bytes.length, sha256: await sha256Of(bytes) })
      await added(path, bytes)
    }
    await added('manifest.json', Buffer.from(`${JSON.stringify({ ...what, files: listed }, null, 2)}\n`))
    zip.end()
  }

  /** Settles when the file is written, or nobody reads any more. */
  const added = (path: string, bytes: Uint8Array): Promise<void> =>
    new Promise((resolve) => {
      const source = Readable.from(piecesOf(bytes))
      source.once('end', resolve)
      output.once('close', resolve)
      zip.addReadStream(source, path, { ...ENTRY, compress: !isPacked(path), size: bytes.length })
    })

  fill().catch((error: unknown) => {
    // Half of an answer has left: all that can be done is to break it off, so that nobody takes it for a whole one.
    log.error({ error: String(error), ...what }, 'an export was broken off')
    output.destroy(error instanceof Error ? error : new Error(String(error)))
  })
  return Readable.toWeb(output) as ReadableStream<Uint8Array>
}
