import { CopyButton } from '@/components/ui/copy-button'

interface CodeBlockProps {
  readonly code: string
  /** What the block holds, above it and for the copy button: "Request", "Answer". */
  readonly title: string
  readonly copy?: boolean
}

/** A piece of code with its title. A long line scrolls inside the block. */
export function CodeBlock({ code, title, copy = true }: CodeBlockProps) {
  return (
    <figure className="min-w-0 border border-hair bg-sheet">
      <figcaption className="flex min-h-8 items-center justify-between border-b border-hair px-3">
        <span className="label">{title}</span>
        {copy ? <CopyButton text={code} what={title.toLowerCase()} /> : null}
      </figcaption>
      <pre tabIndex={0} role="region" aria-label={title} className="num mt-0 overflow-x-auto px-3 py-2.5 text-13 leading-5">
        {code}
      </pre>
    </figure>
  )
}
