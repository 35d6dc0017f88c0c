/** Names that the widget leaves out for those who do not see it, and links that it puts into buttons: the button does the same. */
function mend(root: HTMLElement): void {
  root.querySelector('#servers:not([aria-label])')?.setAttribute('aria-label', 'Server')
  for (const field of root.querySelectorAll('textarea:not([aria-label])')) field.setAttribute('aria-label', 'Request body')
  for (const field of root.querySelectorAll<HTMLElement>('td input:not([aria-label]), td select:not([aria-label])')) {
    const name = field.closest('tr')?.getAttribute('data-param-name') ?? field.getAttribute('placeholder')
    if (name) field.setAttribute('aria-label', name)
  }
  root.querySelector('section.schemes:not([aria-label])')?.setAttribute('aria-label', 'Server and key')
  for (const link of root.querySelectorAll('button a[href]')) link.removeAttribute('href')
  for (const block of root.querySelectorAll('pre:not([tabindex])')) block.setAttribute('tabindex', '0')
}

/** Keeps mending what the widget draws inside `root`, until the returned function is called. */
export function mendReference(root: HTMLElement): () => void {
  mend(root)
  const observer = new MutationObserver(() => mend(root))
  observer.observe(root, { childList: true, subtree: true })
  return () => observer.disconnect()
}
