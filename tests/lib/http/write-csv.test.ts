import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { csvWriter } from '@/lib/http/write-csv'
import { finishInSlices } from '@/lib/in-slices'

async function written(entry: z.ZodObject, records: readonly Readonly<Record<string, unknown>>[]): Promise<string> {
  const writer = csvWriter([], entry)
  for (const record of records) writer.take(record)
  return (await finishInSlices(writer.finish())).chunks.join('')
}

describe('csvWriter', () => {
  it('names the columns by the JSON path and ends every line with CRLF (RFC 4180)', async () => {
    const entry = z.strictObject({
      configuration: z.array(z.number()),
      pose: z.strictObject({ position: z.array(z.number()) }),
      jacobian: z.array(z.array(z.number())),
      note: z.boolean().nullable(),
    })
    const records = [
      { configuration: [0.1, -2], pose: { position: [1, 2, 3] }, jacobian: [[1], [2]], note: null },
      { configuration: [0.5, 1e-7], pose: { position: [4, 5, 6] }, jacobian: [[3], [4]], note: true },
    ]
    expect(await written(entry, records)).toBe(
      'configuration.0,configuration.1,pose.position.0,pose.position.1,pose.position.2,jacobian.0.0,jacobian.1.0,note\r\n' +
        '0.1,-2,1,2,3,1,2,\r\n' +
        '0.5,1e-7,4,5,6,3,4,true\r\n',
    )
  })

  it('quotes what would read as more than one cell, and keeps text from being computed', async () => {
    const entry = z.strictObject({ text: z.string() })
    expect(await written(entry, [{ text: 'one "two"\nthree, four' }, { text: '=1+1' }])).toBe('text\r\n"one ""two""\nthree, four"\r\n\'=1+1\r\n')
  })
})
