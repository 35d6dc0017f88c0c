import { Button } from '@/components/ui/button'
import { ProgressBar } from '@/components/ui/progress-bar'
import { fileSizeText } from './file-size'

interface UploadProgressProps {
  readonly label: string
  readonly sent: number
  readonly total: number
  readonly onCancel: () => void
}

/** How much of a file has left, and a way to stop it. */
export function UploadProgress({ label, sent, total, onCancel }: UploadProgressProps) {
  const done = Math.min(sent, total)
  const text = done >= total ? `${fileSizeText(total)} sent, waiting for the answer` : `${fileSizeText(done)} of ${fileSizeText(total)}`
  return (
    <div className="flex items-end gap-4">
      <div className="grow">
        <ProgressBar label={label} done={done} total={total} text={text} />
      </div>
      <Button onClick={onCancel}>Cancel</Button>
    </div>
  )
}
