import { addressOf } from './address'
import type { Answer, Ask } from './ask'
import { cancelled, refusalFrom, unreachable } from './refusal'
import { ROUTES } from './routes'

type UploadName = 'checkImport' | 'createModel' | 'createRevision'

/** Sends a file with the text fields of its form. sent: bytes on their way, called as they leave; equal to total when
 *  only the answer is waited for. XMLHttpRequest, because fetch does not say how much of a body has left. */
export function upload<N extends UploadName>(name: N, ask: Ask<N>, sent?: (bytes: number, total: number) => void): Promise<Answer<N>> {
  const form = new FormData()
  for (const [field, value] of Object.entries(ask.form ?? {})) {
    if (typeof value === 'string' && value !== '') form.append(field, value)
  }
  if (ask.file !== undefined) form.append('file', ask.file, ask.file.name)
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest()
    request.open(ROUTES[name][0], addressOf(name, ask.path))
    request.setRequestHeader('Accept', 'application/json')
    request.upload.onprogress = (event) => sent?.(event.loaded, event.total)
    request.onload = () => {
      if (request.status < 200 || request.status > 299) return reject(refusalFrom(request.status, request.responseText))
      resolve(JSON.parse(request.responseText) as Answer<N>)
    }
    request.onerror = () => reject(unreachable())
    request.onabort = () => reject(cancelled())
    if (ask.signal?.aborted === true) return reject(cancelled())
    ask.signal?.addEventListener('abort', () => request.abort(), { once: true })
    request.send(form)
  })
}
