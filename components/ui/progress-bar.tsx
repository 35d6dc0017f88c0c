interface ProgressBarProps {
  readonly label: string
  /** How much is done, in the unit of total. */
  readonly done: number
  readonly total: number
  /** The count in words, such as "3.1 of 8.0 MiB". */
  readonly text: string
}

/** How far a long work has come, with its count. */
export function ProgressBar({ label, done, total, text }: ProgressBarProps) {
  const part = total > 0 ? Math.min(1, Math.max(0, done / total)) : 0
  return (
    <div>
      <div className="flex items-baseline justify-between gap-4">
        <span className="font-semibold">{label}</span>
        <span className="num text-soft">{text}</span>
      </div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={Math.round(part * 100)}
        aria-valuetext={text}
        className="mt-1 h-2 border border-soft"
      >
        <div className="h-full bg-blue" style={{ width: `${part * 100}%` }} />
      </div>
    </div>
  )
}
