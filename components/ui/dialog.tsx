'use client'
import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'

interface DialogProps {
  readonly title: string
  /** One sentence under the title. */
  readonly description?: ReactNode
  /** What opens it, when it is not opened from outside. */
  readonly trigger?: ReactNode
  readonly open?: boolean
  readonly onOpenChange?: (open: boolean) => void
  readonly children: ReactNode
}

/** A question in front of the page: focus stays inside, Escape closes, and focus returns to what opened it. */
export function Dialog({ title, description, trigger, open, onOpenChange, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {trigger === undefined ? null : <Radix.Trigger asChild>{trigger}</Radix.Trigger>}
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-[rgb(8_12_18/0.5)]" />
        <Radix.Content
          className="come fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] max-w-lg -translate-x-1/2 -translate-y-1/2 overflow-y-auto border-2 border-ink bg-sheet p-5 shadow-float"
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
        >
          <Radix.Title className="text-18 font-semibold">{title}</Radix.Title>
          {description === undefined ? null : <Radix.Description className="mt-1 text-soft">{description}</Radix.Description>}
          <div className="mt-4">{children}</div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}

/** Closes the dialog around it. */
export const DialogClose = ({ children }: { readonly children: ReactNode }) => <Radix.Close asChild>{children}</Radix.Close>
