import { Button } from '@/components/ui/button'
import { TextLink } from '@/components/ui/text-link'

interface TwinNoticeProps {
  readonly href: string
  readonly revision: number
  readonly busy: boolean
  readonly onStore: () => void
}

/** The file computes the same numbers as a revision that is there: shows it, and offers to store the file all the same. */
export function TwinNotice({ href, revision, busy, onStore }: TwinNoticeProps) {
  return (
    <div role="alert" className="border-l-2 border-amber bg-wash px-4 py-3">
      <p className="font-semibold text-amber">The same kinematics is already there</p>
      <p className="mt-1">
        <TextLink inline href={href} target="_blank">
          Revision {revision}
        </TextLink>{' '}
        has the same fingerprint: both files compute the same numbers. Nothing was stored. A further revision makes sense when comments, masses or
        meshes changed.
      </p>
      <Button className="mt-2" busy={busy} busyLabel="Storing…" onClick={onStore}>
        Store all the same
      </Button>
    </div>
  )
}
