import Form from 'next/form'
import { Button } from '@/components/ui/button'
import { controlLook } from '@/components/ui/field'
import { statusWord } from '@/components/ui/status-mark'
import type { RevisionSummary } from '@/lib/contract/model'

interface ComparisonChooserProps {
  /** Address of the page without its query. */
  readonly action: string
  readonly revisions: readonly RevisionSummary[]
  readonly from: number
  readonly to: number
  readonly base: string
  readonly tip: string
}

/** Chooses the two revisions, and the links between which they are compared. Works without script. */
export function ComparisonChooser({ action, revisions, from, to, base, tip }: ComparisonChooserProps) {
  return (
    <Form action={action} data-screen-only className="mb-4 flex flex-wrap items-end gap-3" aria-label="What is compared">
      <RevisionSelect name="from" label="From revision" value={from} revisions={revisions} />
      <RevisionSelect name="to" label="To revision" value={to} revisions={revisions} />
      <LinkInput name="base" label="Base link" value={base} />
      <LinkInput name="tip" label="Tip link" value={tip} />
      <Button type="submit">Compare</Button>
    </Form>
  )
}

function RevisionSelect({ name, label, value, revisions }: { readonly name: string; readonly label: string; readonly value: number; readonly revisions: readonly RevisionSummary[] }) {
  return (
    <label className="min-w-40">
      <span className="mb-1 block font-semibold">{label}</span>
      <select key={value} name={name} defaultValue={value} className={controlLook(undefined, 'pr-6')}>
        {revisions.map(({ revision, status }) => (
          <option key={revision} value={revision}>
            {revision}, {statusWord(status)}
          </option>
        ))}
      </select>
    </label>
  )
}

function LinkInput({ name, label, value }: { readonly name: string; readonly label: string; readonly value: string }) {
  return (
    <label className="min-w-40">
      <span className="mb-1 block font-semibold">{label}</span>
      <input key={value} name={name} defaultValue={value} placeholder="default" autoComplete="off" spellCheck={false} className={controlLook(undefined, 'num')} />
    </label>
  )
}
