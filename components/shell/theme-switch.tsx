'use client'
import { DropdownMenu } from 'radix-ui'
import { useState } from 'react'
import { Mark } from '@/components/ui/marks'
import { remember } from '@/components/ui/remember'

const THEMES = [
  { value: 'system', label: 'As the system' },
  { value: 'paper', label: 'Paper' },
  { value: 'night', label: 'Night shift' },
] as const

/** Chooses paper, night shift or what the system says; remembered in a cookie that the layout reads. */
export function ThemeSwitch({ initial }: { readonly initial: string }) {
  const [theme, setTheme] = useState(initial)
  const choose = (next: string) => {
    setTheme(next)
    remember('theme', next)
    if (next === 'system') delete document.documentElement.dataset.theme
    else document.documentElement.dataset.theme = next
  }
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger
        className="grid size-8 place-items-center text-ink hover:text-blue pointer-coarse:size-11"
        aria-label={`Theme: ${THEMES.find((item) => item.value === theme)?.label ?? 'As the system'}`}
      >
        <Mark name="theme" className="size-4" />
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align="end" sideOffset={6} className="come z-50 min-w-40 border border-ink bg-sheet py-1 shadow-float">
          <DropdownMenu.RadioGroup value={theme} onValueChange={choose}>
            {THEMES.map((item) => (
              <DropdownMenu.RadioItem
                key={item.value}
                value={item.value}
                className="flex min-h-8 cursor-pointer items-center gap-2 px-3 outline-none data-highlighted:bg-wash data-[state=checked]:font-semibold pointer-coarse:min-h-11"
              >
                <span className="w-3.5">
                  <DropdownMenu.ItemIndicator>
                    <Mark name="released" className="size-3 text-blue" />
                  </DropdownMenu.ItemIndicator>
                </span>
                {item.label}
              </DropdownMenu.RadioItem>
            ))}
          </DropdownMenu.RadioGroup>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  )
}
