import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { FindingItem } from '@/components/import/finding-item'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

describe('FindingItem', () => {
  const [finding] = parseUrdf(new TextEncoder().encode('<robot name="r"><link name="a"/><link name="a"/></robot>')).findings
  const html = renderToStaticMarkup(<FindingItem finding={finding!} isChosen onChoose={() => undefined} />)

  it('says severity, place, what is there and what to do, and leads to the page of the rule', () => {
    expect(html).toContain('error')
    expect(html).toContain(`L${finding!.line}:${finding!.column}`)
    expect(html).toContain('/docs/findings/duplicate-link')
    expect(html).toContain('copy')
  })

  it('tells a screen reader which finding the source shows', () => expect(html).toContain('aria-pressed="true"'))
})
