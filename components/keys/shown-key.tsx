'use client'

import { Button } from '@/components/ui/button'
import { CopyButton } from '@/components/ui/copy-button'

interface ShownKeyProps {
  readonly text: string
  readonly request: string | null
  readonly onKept: () => void
}

/** A new key, this once. */
export function ShownKey({ text, request, onKept }: ShownKeyProps) {
  return (
    <div className="space-y-4">
      <p className="border-l-2 border-amber pl-3 font-medium text-amber">
        This is the only time it is shown. Copy it now to where it is kept, such as the secret store of the gateway; here only its SHA-256 stays.
      </p>
      <div className="border border-soft p-3">
        <p className="label">Key</p>
        <p className="num break-all select-all">{text}</p>
        <CopyButton text={text} what="key" label="copy the key" className="-ml-1" />
      </div>
      {request === null ? null : (
        <div>
          <div className="flex items-baseline justify-between">
            <h3 className="text-13">Try it</h3>
            <CopyButton text={request} what="request" />
          </div>
          <pre className="overflow-x-auto border border-hair p-3 text-12" tabIndex={0} role="region" aria-label="Request">
            <code>{request}</code>
          </pre>
        </div>
      )}
      <div className="flex justify-end">
        <Button variant="primary" onClick={onKept}>
          I have kept it
        </Button>
      </div>
    </div>
  )
}
