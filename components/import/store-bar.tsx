import { Button } from '@/components/ui/button'
import { UploadProgress } from './upload-progress'
import type { Storing } from './storing'

interface StoreBarProps {
  readonly label: string
  readonly storing: Storing
  /** Bytes of the file. */
  readonly total: number
  readonly ready: boolean
}

/** The button that stores, how far it has come, and what went wrong. */
export function StoreBar({ label, storing, total, ready }: StoreBarProps) {
  return (
    <div className="space-y-3">
      <p role="alert" className="font-medium text-verm empty:hidden">
        {storing.failure}
      </p>
      {storing.busy ? <UploadProgress label="Storing" sent={storing.sent} total={total} onCancel={storing.cancel} /> : null}
      <Button type="submit" variant="primary" busy={storing.busy} busyLabel="Storing…" disabled={!ready}>
        {label}
      </Button>
    </div>
  )
}
