import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { TextField } from '@/components/ui/text-field'

describe('TextField', () => {
  it('ties label, hint and error to the control, and gives the error a place that is announced', () => {
    const html = renderToStaticMarkup(<TextField id="name" label="Name" hint="As in title blocks." error="Give a name." />)
    expect(html).toContain('for="name"')
    expect(html).toContain('aria-describedby="name-error name-hint"')
    expect(html).toContain('aria-invalid="true"')
    expect(html).toMatch(/<p id="name-error" aria-live="polite"[^>]*>Give a name\.<\/p>/)
  })

  it('keeps the place of the error while there is none, so that its text is announced when it comes', () => {
    const html = renderToStaticMarkup(<TextField id="name" label="Name" />)
    expect(html).toContain('id="name-error"')
    expect(html).not.toContain('aria-invalid')
    expect(html).not.toContain('aria-describedby')
  })
})
