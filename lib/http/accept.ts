import { fail } from '@/lib/errors'

/** How much an Accept field (RFC 9110 section 12.5.1) wants a media type, from 0 (not at all) to 1. */
function qualityOf(accept: string, mediaType: string): number {
  const [type] = mediaType.split('/')
  const ranges = accept.split(',').map((range) => {
    const [name = '', ...parameters] = range.split(';').map((part) => part.trim().toLowerCase())
    const quality = parameters.find((parameter) => parameter.startsWith('q='))?.slice(2)
    const weight = quality === undefined ? 1 : Number(quality)
    return { name, quality: Number.isNaN(weight) ? 1 : Math.min(Math.max(weight, 0), 1) }
  })
  // The most specific range that matches decides.
  return [mediaType, `${type}/*`, '*/*'].map((name) => ranges.find((range) => range.name === name)).find((range) => range !== undefined)?.quality ?? 0
}

/** The media type on offer that the caller wants most; of several wanted alike the first. Fails with not-acceptable when it takes none. */
export function chooseMediaType<M extends string>(headers: Headers, offered: readonly [M, ...M[]]): M {
  const accept = headers.get('accept')
  if (accept === null || accept.trim() === '') return offered[0]
  const qualities = offered.map((mediaType) => qualityOf(accept, mediaType))
  const most = Math.max(...qualities)
  if (most === 0) fail('not-acceptable', `This operation answers in ${offered.join(' or ')}; the Accept field leaves ${offered.length === 1 ? 'that' : 'those'} out.`)
  return offered[qualities.indexOf(most)]!
}
