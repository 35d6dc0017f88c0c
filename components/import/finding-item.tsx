import clsx from 'clsx'
import { CopyButton } from '@/components/ui/copy-button'
import { SeverityMark } from '@/components/ui/severity-mark'
import { TextLink } from '@/components/ui/text-link'
import type { Finding } from '@/lib/contract/description'

interface FindingItemProps {
  readonly finding: Finding
  readonly isChosen: boolean
  readonly onChoose: () => void
}

/** One finding: what is there and what follows, where, and what to do about it. */
export function FindingItem({ finding, isChosen, onChoose }: FindingItemProps) {
  const { severity, line, column, element, message, remedy, rule } = finding
  return (
    <article className={clsx('border-b border-hair py-2.5 pl-2.5', isChosen ? 'border-l-2 border-l-blue bg-wash' : 'border-l-2 border-l-transparent')}>
      <div className="flex flex-wrap items-baseline gap-x-3">
        <SeverityMark severity={severity} />
        <button
          type="button"
          onClick={onChoose}
          aria-pressed={isChosen}
          className="num min-h-6 text-blue underline-offset-3 hover:underline pointer-coarse:min-h-11"
          aria-label={`Show line ${line}, column ${column} in the source`}
        >
          L{line}:{column}
        </button>
        {element === undefined ? null : (
          <span className="label min-w-0 break-all">
            <bdi>{element}</bdi>
          </span>
        )}
        <TextLink href={`/docs/findings/${rule}`} className="ml-auto pr-2" target="_blank">
          {rule}
          <span className="sr-only"> (page of this rule, in a new tab)</span>
        </TextLink>
      </div>
      <p className="mt-1 pr-2 break-words">{message}</p>
      <p className="mt-0.5 pr-2 break-words text-soft">
        {remedy} <CopyButton text={remedy} what="remedy" className="align-baseline" />
      </p>
    </article>
  )
}
