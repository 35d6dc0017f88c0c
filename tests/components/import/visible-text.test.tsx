import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { VisibleText } from '@/components/import/visible-text'

const shown = (text: string): string => renderToStaticMarkup(<VisibleText text={text} />)

describe('VisibleText', () => {
  it.each([
    ['\0', 'U+0000'],
    ['\u001b', 'U+001B'],
    ['\u202e', 'U+202E'],
    ['\u200b', 'U+200B'],
    ['\ufeff', 'U+FEFF'],
    ['\ufffd', 'U+FFFD'],
  ])('writes the code of a hidden character', (character, code) => expect(shown(`a${character}b`)).toContain(`${code}</span>b`))

  it('leaves tabs, letters of every script and joined emoji as they are', () => {
    for (const text of ['\tname="Größe"', 'ذراع', '腕', '🦾']) expect(shown(text)).not.toContain('U+')
  })

  it('escapes markup', () => expect(shown('<script>\0')).toMatch(/^&lt;script&gt;/))
})
