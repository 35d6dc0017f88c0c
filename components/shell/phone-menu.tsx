'use client'
import { Dialog } from 'radix-ui'
import type { ReactNode } from 'react'
import { Mark } from '@/components/ui/marks'

/** The header's second half on a narrow screen: opens under the header and closes on any link, button or Escape. */
export function PhoneMenu({ children }: { readonly children: ReactNode }) {
  return (
    <Dialog.Root>
      <Dialog.Trigger className="flex min-h-11 items-center gap-2 px-2 font-semibold desk:hidden">
        <Mark name="menu" className="size-4" />
        Menu
      </Dialog.Trigger>
      <Dialog.Portal>
        <Dialog.Overlay className="fixed inset-0 z-40 bg-[rgb(8_12_18/0.5)] desk:hidden" />
        <Dialog.Content
          aria-describedby={undefined}
          className="come fixed inset-x-0 top-0 z-50 max-h-dvh overflow-y-auto border-b-2 border-ink bg-sheet px-4 pb-4 desk:hidden"
        >
          <div className="flex h-12 items-center justify-between">
            <Dialog.Title className="text-15 font-bold">Menu</Dialog.Title>
            <Dialog.Close className="flex min-h-11 items-center gap-2 px-2 font-semibold">
              <Mark name="close" className="size-4" />
              Close
            </Dialog.Close>
          </div>
          {children}
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  )
}

/** Wraps a link of the menu, so that following it closes the menu. */
export const PhoneMenuItem = ({ children }: { readonly children: ReactNode }) => <Dialog.Close asChild>{children}</Dialog.Close>
