export const JSON_TYPE = 'application/json'
export const CSV_TYPE = 'text/csv'
export const RECORD_TYPE = 'application/octet-stream'

/** The formats of results, one for each configuration or target. The first is what is answered where nothing is said. */
export const RECORD_MEDIA_TYPES = [JSON_TYPE, CSV_TYPE, RECORD_TYPE] as const
export type RecordMediaType = (typeof RECORD_MEDIA_TYPES)[number]
