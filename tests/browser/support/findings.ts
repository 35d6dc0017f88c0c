import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from '@playwright/test'

/** Rules that the OpenAPI widget breaks in markup of its own, which no style can mend. Its colours are ours, so contrast counts. */
const WIDGET_RULES: Readonly<Record<string, string>> = {
  'heading-order': 'its headings start at the level of the document title',
  'nested-interactive': 'the head of an operation is a button that holds a button',
  'select-name': 'the chooser of a media type has no label',
  'label': 'a parameter is named by the table head and not by a label',
  'scrollable-region-focusable': 'an example scrolls without taking the focus',
}
const WIDGET = '.swagger-ui'

/** What axe finds on the page, a line for each element. */
export async function violations(page: Page): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page }).analyze()
  const lines = await Promise.all(
    found.flatMap(({ id, help, nodes }) =>
      nodes.map(async ({ target, failureSummary }) => {
        const selector = target.flat().join(' ')
        const isWidgets = id in WIDGET_RULES && (await page.locator(`${WIDGET} ${selector}, ${selector}:is(${WIDGET} *)`).count().catch(() => 0)) > 0
        return isWidgets ? null : `${id}: ${help}: ${selector}: ${failureSummary?.split('\n').at(-1)?.trim()}`
      }),
    ),
  )
  return lines.filter((line) => line !== null)
}

/** By how many pixels the page is wider than the window. */
export const overflowPx = (page: Page): Promise<number> =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)

/** Visible text set smaller than 12 px. */
export const smallText = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT)
    const small = new Set<string>()
    for (let node = walker.nextNode(); node !== null; node = walker.nextNode()) {
      const text = node.textContent?.trim() ?? ''
      const element = node.parentElement
      if (text === '' || element === null || element.closest('script, style, noscript') !== null) continue
      // Text in a drawing is scaled with it: its size on the screen counts.
      const scale = element instanceof SVGGraphicsElement ? (element.getScreenCTM()?.a ?? 1) : 1
      const size = Number.parseFloat(getComputedStyle(element).fontSize) * scale
      if (element.checkVisibility({ visibilityProperty: true }) && size < 11.95) small.add(`${size.toFixed(1)} px: ${text.slice(0, 60)}`)
    }
    return [...small]
  })

/** Visible text that its box cuts off without a way to scroll to the rest. What is meant as an excerpt says so (data-excerpt). */
export const cutText = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const cut: string[] = []
    for (const element of document.body.querySelectorAll<HTMLElement>('*')) {
      if (element.clientWidth <= 1 || element.closest('[data-excerpt], .sr-only, script, style, svg') !== null) continue
      const { overflowX, overflowY } = getComputedStyle(element)
      const hides = (overflow: string) => overflow === 'hidden' || overflow === 'clip'
      const isCut = (hides(overflowX) && element.scrollWidth > element.clientWidth + 1) || (hides(overflowY) && element.scrollHeight > element.clientHeight + 1)
      if (isCut && element.checkVisibility() && element.innerText.trim() !== '') cut.push(`${element.tagName.toLowerCase()}.${element.className}: ${element.innerText.slice(0, 60)}`)
    }
    return cut
  })
