import { Readable } from 'node:stream'
import { setImmediate as turn } from 'node:timers/promises'
import { CsvError, parse } from 'csv-parse'
import { fail } from '@/lib/errors'

/** A table as cells of text. */
export interface TextTable {
  readonly records: readonly TextRecord[]
  readonly delimiter: ',' | ';' | '\t'
}

export interface TextRecord {
  /** Line of the text, from 1. */
  readonly row: number
  readonly cells: readonly string[]
}

/** What a spreadsheet may write above its table to say what separates the columns. */
const SEPARATOR_LINE = /^sep=([,;\t])\r?\n/i

/** Semicolon and tab are tried first: where the decimal mark is a comma, spreadsheets separate by them. */
function delimiterOf(text: string): TextTable['delimiter'] {
  const firstLine = text.trimStart().split(/\r\n|\r|\n/, 1)[0]!.replaceAll(/"[^"]*"/g, '')
  return firstLine.includes(';') ? ';' : firstLine.includes('\t') ? '\t' : ','
}

/** Read in pieces of so many bytes, between which others have their turn. */
const PIECE = 32 * 1024

async function* piecesOf(bytes: Buffer): AsyncGenerator<Buffer> {
  for (let at = 0; at < bytes.length; at += PIECE) {
    yield bytes.subarray(at, at + PIECE)
    await turn()
  }
}

/** Reads CSV (RFC 4180), also separated by semicolons or tabs. Blank lines are passed over; reading stops when there are more than
 *  `most` records. Fails with malformed-body. */
export async function readTable(text: string, most: number): Promise<TextTable> {
  const plain = text.replace(/^\ufeff/, '')
  const said = SEPARATOR_LINE.exec(plain)
  const body = said === null ? plain : plain.slice(said[0].length)
  const linesBefore = said === null ? 0 : 1
  const delimiter = (said?.[1] as TextTable['delimiter'] | undefined) ?? delimiterOf(body)
  const parser = Readable.from(piecesOf(Buffer.from(body))).pipe(parse({ delimiter, trim: true, relaxColumnCount: true, info: true }))
  const records: TextRecord[] = []
  try {
    for await (const { record, info } of parser as AsyncIterable<{ record: string[]; info: { lines: number } }>) {
      if (record.every((cell) => cell === '')) continue
      records.push({ row: info.lines + linesBefore, cells: record })
      if (records.length > most) break
    }
    return { records, delimiter }
  } catch (error) {
    if (!(error instanceof CsvError)) throw error
    const row = typeof error.lines === 'number' ? `row ${error.lines + linesBefore}: ` : ''
    fail('malformed-body', `The table does not parse as CSV: ${row}${sentenceOf(error.code)}.`)
  }
}

const SENTENCES: Partial<Record<string, string>> = {
  CSV_QUOTE_NOT_CLOSED: 'a quote is opened and never closed',
  CSV_INVALID_CLOSING_QUOTE: 'something stands behind a closing quote',
  INVALID_OPENING_QUOTE: 'a quote stands in the middle of a cell',
}

const sentenceOf = (code: string): string => SENTENCES[code] ?? 'its quotes or separators are not in order'
