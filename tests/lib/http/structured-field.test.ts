import { describe, expect, it } from 'vitest'
import { fieldText } from '@/lib/http/structured-field'

describe('fieldText (RFC 9651)', () => {
  it.each([
    ['base_link', '"base_link"'],
    ['', '""'],
    ['a "b" \\c', '"a \\"b\\" \\\\c"'],
    // The example of section 3.3.8.
    ['This is intended for display to üsers.', '%"This is intended for display to %c3%bcsers."'],
    ['100 % "ü"', '%"100 %25 %22%c3%bc%22"'],
    ['line\nbreak', '%"line%0abreak"'],
    ['腕', '%"%e8%85%95"'],
  ])('writes %j as %s', (text, field) => expect(fieldText(text)).toBe(field))
})
