import { expect, type Page } from '@playwright/test'
import { overflowPx, smallText, violations } from './findings'

interface View {
  readonly name: string
  readonly size: { readonly width: number; readonly height: number }
  readonly colorScheme: 'light' | 'dark'
}

/** A desk and a phone, by day and by night. */
export const VIEWS: readonly View[] = [
  { name: '1440-paper', size: { width: 1440, height: 900 }, colorScheme: 'light' },
  { name: '1440-night', size: { width: 1440, height: 900 }, colorScheme: 'dark' },
  { name: '390-paper', size: { width: 390, height: 844 }, colorScheme: 'light' },
  { name: '390-night', size: { width: 390, height: 844 }, colorScheme: 'dark' },
]

/** Waits until everything on the page has arrived. */
async function settle(page: Page): Promise<void> {
  await page.waitForLoadState('networkidle')
  await page.evaluate(() => document.fonts.ready)
}

/** Opens a page as it is seen in a view. */
export async function open(page: Page, { size, colorScheme }: View, address: string): Promise<void> {
  await page.setViewportSize(size)
  await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
  await page.goto(address)
  await settle(page)
}

/** Takes a picture of the page as it stands, for people to look at, and checks what a machine can see. */
export async function look(page: Page, view: View, name: string): Promise<void> {
  await settle(page)
  await page.screenshot({ path: `tests/screens/${name}-${view.name}.png`, fullPage: true, animations: 'disabled' })
  expect.soft(await violations(page), 'axe finds nothing').toEqual([])
  expect.soft(await overflowPx(page), 'the page is no wider than the window').toBe(0)
  expect.soft(await smallText(page), 'no text is smaller than 12 px').toEqual([])
}
