import { fail } from '@/lib/errors'

/** Whether an Accept field (RFC 9110 section 12.5.1) allows the media type. */
function allows(accept: string, mediaType: string): boolean {
  const [type] = mediaType.split('/')
  const ranges = accept.split(',').map((range) => {
    const [name = '', ...parameters] = range.split(';').map((part) => part.trim().toLowerCase())
    const quality = parameters.find((parameter) => parameter.startsWith('q='))?.slice(2)
    return { name, refused: quality !== undefined && Number(quality) === 0 }
  })
  // The most specific range that matches decides.
  const match = [mediaType, `${type}/*`, '*/*'].map((name) => ranges.find((range) => range.name === name)).find((range) => range !== undefined)
  return match !== undefined && !match.refused
}

/** Fails with not-acceptable when the caller takes none of what is on offer. */
export function checkAccept(headers: Headers, mediaType: string): void {
  const accept = headers.get('accept')
  if (accept !== null && accept.trim() !== '' && !allows(accept, mediaType)) {
    fail('not-acceptable', `This operation answers in ${mediaType}; the Accept field leaves that out.`)
  }
}
