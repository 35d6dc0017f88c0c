import { describe, expect, it } from 'vitest'
import { marked, parse, rulesOf } from './urdf-text'

/** Faults by XML 1.0 (fifth edition); ¦ marks the place where each is expected. */
const MALFORMED: readonly (readonly [string, string])[] = [
  ['an element that is not closed', '<robot>\n  ¦<link name="a">\n'],
  ['a tag that is not closed', '<robot>¦<link name="a"'],
  ['end tags in the wrong order', '<robot><a><b></a>'.replace('</a>', '¦</a></b></robot>')],
  ['an end tag too many', '¦</robot>'],
  ['an end tag with an attribute', '<robot>¦</robot a="b">'],
  ['a blank before the name of an element', '<robot>< link/></robot>'.replace('< ', '<¦ ')],
  ['a name that begins with a digit', '<robot><¦1a/></robot>'],
  ['an attribute without a value', '<robot><link name¦/></robot>'],
  ['an attribute without quotes', '<robot><link name=¦a/></robot>'],
  ['an attribute that is given twice', '<robot><link name="a" ¦name="b"/></robot>'],
  ['attributes without a blank between', '<robot><link name="a"¦b="c"/></robot>'],
  ['a quote that is not closed', '<robot><link name=¦"a/></robot>'],
  ["a quote that swallows a tag", '<robot><link name="a/>\n¦<link name="b"/></robot>'],
  ['a slash inside a tag', '<robot><link ¦/ name="a"/></robot>'],
  ['a lone ampersand in a value', '<robot><link name="a¦&b"/></robot>'],
  ['an entity that is not defined', '<robot><link name="a¦&nbsp;b"/></robot>'],
  ['an ampersand in text', '<robot>a ¦& b</robot>'],
  ['a reference to U+0000', '<robot><link name="a¦&#0;"/></robot>'],
  ['a reference to half a surrogate pair', '<robot><link name="¦&#xD800;"/></robot>'],
  ['a reference to a control character', '<robot><link name="¦&#8;"/></robot>'],
  ['a reference to U+FFFE', '<robot><link name="¦&#xfffe;"/></robot>'],
  ['a reference beyond Unicode', '<robot><link name="¦&#x110000;"/></robot>'],
  ['a reference without digits', '<robot><link name="¦&#;"/></robot>'],
  ['a reference that is not closed', '<robot><link name="¦&lt"/></robot>'],
  ['a control character', '<robot>\n<link name="a¦\u0001"/></robot>'],
  ['a NUL', '<robot>¦\0</robot>'],
  ['U+FFFF', '<robot>¦\uFFFF</robot>'],
  ['two hyphens in a comment', '<robot><!-- a ¦-- b --></robot>'],
  ['a comment that is not closed', '<robot>¦<!-- a </robot>'],
  ['a comment that ends with three hyphens', '<robot><!-- a ¦---></robot>'],
  ['a CDATA section that is not closed', '<robot>¦<![CDATA[ a </robot>'],
  ['the end of a CDATA section in text', '<robot>a ¦]]> b</robot>'],
  ['a processing instruction that is not closed', '<robot>¦<?a </robot>'],
  ['a processing instruction without a name', '<robot>¦<? a?></robot>'],
  ['an XML declaration behind a line', '\n¦<?xml version="1.0"?><robot/>'],
  ['an XML declaration inside', '<robot>¦<?xml version="1.0"?></robot>'],
  ['an XML declaration without version', '¦<?xml encoding="UTF-8"?><robot/>'],
  ['an XML declaration in capitals', '¦<?XML version="1.0"?><robot/>'],
  ['a declaration that does not exist', '<robot>¦<!link></robot>'],
  ['comments alone', '¦<!-- nothing -->'],
  ['a lone angle', '<robot>a <¦ b</robot>'],
]

describe('scanXml', () => {
  it.each(MALFORMED)('refuses %s and points at it', (_what, source) => {
    const { text, line, column } = marked(source)
    const { description, findings } = parse(text)
    expect(description).toBeNull()
    expect(findings.map((finding) => [finding.rule, finding.line, finding.column])).toEqual([['xml-malformed', line, column]])
  })

  it('says which element the wrong end tag should have closed, and where that was opened', () => {
    const [finding] = parse('<robot>\n<link name="a">\n</robot>').findings
    expect(finding!.message).toBe('</robot> stands where </link> is expected: the <link> of line 2 is not closed.')
  })

  it('accepts 64 levels, 64 attributes, 200 000 elements and names of 256 characters', () => {
    const deep = '<a>'.repeat(63) + '</a>'.repeat(63)
    const wide = `<a ${Array.from({ length: 64 }, (_, i) => `a${i}=""`).join(' ')}/>`
    const many = '<a/>'.repeat(200_000 - 1 - 1 - 1 - 63)
    const text = `<robot name="${'🤖'.repeat(256)}"><link name="${'é'.repeat(256)}"/>${wide}${deep}${many}</robot>`
    expect(rulesOf(parse(text).findings)).toEqual(['name-unusual', 'unknown-element'])
  })

  it('decodes references in names and in references to names', () => {
    const text = `<robot name="&#65;&amp;&#x42;"><link name="a&lt;&quot;&apos;&gt;"/><link name="b&#x1F916;"/>
      <joint name="j" type="fixed"><parent link="a&#60;&#34;'>"/><child link="b&#129302;"/></joint></robot>`
    const { description, findings } = parse(text)
    expect(rulesOf(findings)).toEqual(['name-unusual'])
    expect(description!.robotName).toBe('A&B')
    expect(description!.links.map(({ name }) => name)).toEqual([`a<"'>`, 'b🤖'])
    expect(description!.joints[0]).toMatchObject({ parent: `a<"'>`, child: 'b🤖' })
  })

  it('does not decode what a reference has made', () => {
    expect(parse('<robot name="&amp;lt;&#38;amp;"><link name="a"/></robot>').description!.robotName).toBe('&lt;&amp;')
  })

  it('turns a line end in a value into one blank, and keeps a referenced one (XML 1.0, 3.3.3)', () => {
    const { description } = parse('<robot name="a\r\nb\tc&#10;d"><link name="l"/></robot>')
    expect(description!.robotName).toBe('a b c\nd')
  })
})
