'use client'
import { Toaster as Sonner } from 'sonner'

/** Where short messages appear and are announced. Raise one with `toast` from sonner. */
export function Toaster() {
  return (
    <Sonner
      position="bottom-right"
      duration={6000}
      closeButton
      toastOptions={{
        unstyled: true,
        classNames: {
          toast:
            'relative flex w-full items-start gap-3 rounded-none border-2 border-ink bg-sheet py-3 pr-10 pl-4 text-13 text-ink shadow-float sm:w-[22rem] font-sans',
          title: 'font-semibold',
          description: 'text-soft',
          error: '!border-verm',
          closeButton: 'absolute top-2 right-2 grid size-6 place-items-center text-soft hover:text-ink',
          actionButton: 'ml-auto font-semibold text-blue',
        },
      }}
    />
  )
}
