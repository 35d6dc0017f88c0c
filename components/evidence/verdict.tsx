import clsx from 'clsx'
import { Mark } from '@/components/ui/marks'

/** Whether measured poses are within their tolerance: shape, word and colour. Green is kept for what is released. */
export function Verdict({ passed, className }: { readonly passed: boolean; readonly className?: string }) {
  return (
    <span className={clsx('inline-flex items-baseline gap-1.5 font-semibold whitespace-nowrap', passed ? 'text-ink' : 'text-verm', className)}>
      <Mark name={passed ? 'released' : 'error'} />
      {passed ? 'pass' : 'fail'}
    </span>
  )
}
