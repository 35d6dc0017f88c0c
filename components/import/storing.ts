import { useRef, useState } from 'react'
import type { FieldValues, Path, UseFormSetError } from 'react-hook-form'
import { fieldOf, Refusal, sentenceOf } from '@/components/api/refusal'
import type { Finding } from '@/lib/contract/description'

/** How far the storing of a file has come. */
export interface Storing {
  readonly busy: boolean
  readonly sent: number
  /** Why it was not stored, when that belongs to no field. */
  readonly failure: string | undefined
  readonly store: (send: (signal: AbortSignal, sent: (bytes: number) => void) => Promise<void>) => Promise<void>
  readonly cancel: () => void
}

interface Fields<T extends FieldValues> {
  readonly setError: UseFormSetError<T>
  readonly names: readonly Path<T>[]
  /** Which field a problem is about that names none. */
  readonly byCode?: Partial<Record<string, Path<T>>>
  readonly onFindings: (findings: readonly Finding[]) => void
  /** Takes a refusal that the form shows in its own way; true when it did. */
  readonly onRefusal?: (refusal: Refusal) => boolean
}

/** Sends a file to be stored, and puts each refusal where it belongs: at its field, at the findings, or under the form. */
export function useStoring<T extends FieldValues>({ setError, names, byCode = {}, onFindings, onRefusal }: Fields<T>): Storing {
  const [busy, setBusy] = useState(false)
  const [sent, setSent] = useState(0)
  const [failure, setFailure] = useState<string>()
  const running = useRef<AbortController | null>(null)

  const refuse = (error: unknown) => {
    if (!(error instanceof Refusal)) return setFailure(sentenceOf(error))
    if (onRefusal?.(error) === true) return
    if (error.code === 'import-refused') onFindings(error.findings)
    const own = byCode[error.code]
    const placed = error.faults.flatMap((fault) => names.filter((name) => name === fieldOf(fault)).map((name) => ({ name, detail: fault.detail })))
    for (const { name, detail } of placed) setError(name, { message: detail }, { shouldFocus: true })
    if (own !== undefined) setError(own, { message: error.message }, { shouldFocus: true })
    if (own === undefined && placed.length === 0) setFailure(error.message)
  }

  return {
    busy,
    sent,
    failure,
    cancel: () => running.current?.abort(),
    store: async (send) => {
      if (busy) return
      const control = new AbortController()
      running.current = control
      setBusy(true)
      setSent(0)
      setFailure(undefined)
      await send(control.signal, setSent).catch(refuse)
      setBusy(false)
    },
  }
}
