import { Button } from './button'
import { DialogClose } from './dialog'

interface DialogActsProps {
  /** What went wrong when the form was last sent; announced. */
  readonly failure?: string | undefined
  readonly label: string
  readonly busy: boolean
  readonly busyLabel: string
  readonly variant?: 'primary' | 'danger'
}

/** The end of a form in a dialog: what failed, the way out, and the act. */
export function DialogActs({ failure, label, busy, busyLabel, variant = 'primary' }: DialogActsProps) {
  return (
    <>
      <p role="alert" className="font-medium text-verm empty:hidden">
        {failure}
      </p>
      <div className="flex flex-wrap justify-end gap-3">
        <DialogClose>
          <Button>Cancel</Button>
        </DialogClose>
        <Button type="submit" variant={variant} busy={busy} busyLabel={busyLabel}>
          {label}
        </Button>
      </div>
    </>
  )
}
