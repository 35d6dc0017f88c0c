'use client'
import clsx from 'clsx'
import { useEffect, useState } from 'react'

interface CopyButtonProps {
  readonly text: string
  /** What is copied, as it is read out: "fingerprint". */
  readonly what: string
  readonly label?: string
  readonly className?: string
}

/** Copies a text and says so, to the eye and to a screen reader. */
export function CopyButton({ text, what, label = 'copy', className }: CopyButtonProps) {
  const [state, setState] = useState<'ready' | 'copied' | 'refused'>('ready')
  useEffect(() => {
    if (state === 'ready') return
    const timer = setTimeout(() => setState('ready'), 2500)
    return () => clearTimeout(timer)
  }, [state])
  const copy = () => {
    navigator.clipboard.writeText(text).then(
      () => setState('copied'),
      () => setState('refused'),
    )
  }
  const shown = { ready: label, copied: 'copied', refused: 'not allowed' }[state]
  return (
    <>
      <button
        type="button"
        onClick={copy}
        data-screen-only
        className={clsx('label min-h-6 px-1 text-blue underline-offset-3 hover:underline pointer-coarse:min-h-11', className)}
      >
        {shown}
        <span className="sr-only"> {what}</span>
      </button>
      <span role="status" className="sr-only">
        {state === 'copied' ? `${what} copied` : state === 'refused' ? `The browser does not allow copying the ${what}` : ''}
      </span>
    </>
  )
}
