import type { Series } from '@/lib/access/use-case'
import { columnsOf } from '@/lib/contract/record-columns'
import { fail } from '@/lib/errors'
import { RECORD_TYPE, type RecordMediaType } from './media-types'
import { widthOfRecord } from './record-fields'

const MEBIBYTE = 1024 * 1024
const MOST_ANSWER_BYTES = 64 * MEBIBYTE
/** What one number takes in text, at the most: sign, 17 digits, point, exponent and comma. */
const BYTES_A_NUMBER = 25
/** What stands in text beside the numbers of one result. JSON: names, brackets and words; CSV: words and the commas of empty cells. */
const BYTES_BESIDE = { 'application/json': 400, 'text/csv': 250 } as const

/** Bytes of one result, at the most. */
const bytesEach = (series: Series<unknown>, mediaType: RecordMediaType): number =>
  mediaType === RECORD_TYPE
    ? Float64Array.BYTES_PER_ELEMENT * widthOfRecord(columnsOf(series.fields, series.sizes))
    : BYTES_BESIDE[mediaType] + BYTES_A_NUMBER * series.numbersEach

/** Fails with answer-too-large when the results would exceed 64 MiB in this format. */
export function checkAnswerSize(series: Series<unknown>, mediaType: RecordMediaType): void {
  const each = bytesEach(series, mediaType)
  if (series.count * each <= MOST_ANSWER_BYTES) return
  const most = Math.floor(MOST_ANSWER_BYTES / each)
  const estimate = Math.ceil((series.count * each) / MEBIBYTE)
  fail('answer-too-large', `The answer was estimated at ${estimate} MiB, and 64 MiB is the most. Send at most ${most} ${series.of} at once, or name the fields you need in "include".`)
}
