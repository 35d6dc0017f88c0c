import clsx from 'clsx'
import { TextLink } from '@/components/ui/text-link'

/** What stands wherever a person reads or uses a computed motion. */
export const CAUTION_SENTENCES = [
  'Computed from the model as imported; an engineering aid, not a safety function and no part of one.',
  'Verify every motion at reduced speed with the enabling device in hand.',
  "The machine's risk assessment, local codes and qualified, licensed people decide.",
  'A missing or late answer means hold.',
] as const

/** The caution, as one quiet paragraph. */
export function Caution({ className }: { readonly className?: string }) {
  return (
    <p role="note" aria-label="Caution" className={clsx('label', className)}>
      {CAUTION_SENTENCES.join(' ')}{' '}
      <TextLink inline href="/docs/cautions">
        Cautions
      </TextLink>
    </p>
  )
}
