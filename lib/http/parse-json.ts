import { fail } from '@/lib/errors'

/** Nothing in the contract is nested deeper than 6. */
const MOST_DEPTH = 64
/** The largest question there is, 10 000 references with all their fields, has 150 000 lists, objects, names and texts. */
const MOST_PARTS = 400_000
/** No chain has so many joints, and no list so many entries. */
const MOST_ENTRIES = 100_000
const MOST_CHARACTERS = 1_000_000

/** A list or object that ends within so many characters is left to JSON.parse, which takes a fraction of a millisecond for it. */
const WINDOW = 16 * 1024

const [QUOTE, BACKSLASH, COMMA, COLON] = [0x22, 0x5c, 0x2c, 0x3a] as const
const [LIST, LIST_END, OBJECT, OBJECT_END] = [0x5b, 0x5d, 0x7b, 0x7d] as const
const isBlank = (code: number) => code === 0x20 || code === 0x0a || code === 0x0d || code === 0x09
const SCALAR = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null/y

const refuse = (detail: string) => fail('invalid-request', `The body ${detail}.`, { errors: [{ pointer: '', detail }] })

/** A list or object that is being read. */
interface Open {
  readonly list: unknown[] | null
  readonly fields: Map<string, unknown> | null
  name: string
}

/** Reads a JSON text bit by bit. `next` says what has to come. */
class JsonReader {
  at = 0
  value: unknown
  next: 'value' | 'value or end' | 'name' | 'name or end' | 'colon' | 'comma or end' | 'nothing' | 'done' = 'value'
  private readonly open: Open[] = []
  private parts = 0

  constructor(private readonly text: string) {}

  /** Takes at most a token, a small list or object, or a window of blanks. */
  step(): void {
    const { text } = this
    for (const end = this.at + WINDOW; isBlank(text.charCodeAt(this.at)); this.at++) if (this.at >= end) return
    const code = text.charCodeAt(this.at)
    switch (this.next) {
      case 'value or end':
        return code === LIST_END ? this.close() : this.takeValue(code)
      case 'value':
        return this.takeValue(code)
      case 'name or end':
        return code === OBJECT_END ? this.close() : this.takeName(code)
      case 'name':
        return this.takeName(code)
      case 'colon':
        return this.takeColon(code)
      case 'comma or end':
        return this.takeComma(code)
      default:
        if (this.at < text.length) this.missing('nothing more')
        this.next = 'done'
    }
  }

  private missing(what: string): never {
    const found = this.at < this.text.length ? `found ${JSON.stringify(String.fromCodePoint(this.text.codePointAt(this.at)!))}` : 'it ends'
    fail('malformed-body', `The body is not JSON: at character ${this.at + 1}, where ${what} has to come, ${found}.`)
  }

  private count(parts: number): void {
    this.parts += parts
    if (this.parts > MOST_PARTS) refuse(`holds more than ${MOST_PARTS} lists, objects and texts`)
  }

  private takeValue(code: number): void {
    if (code === LIST || code === OBJECT) {
      if (this.takeWhole()) return
      if (this.open.length >= MOST_DEPTH) refuse(`is nested deeper than ${MOST_DEPTH} levels`)
      this.count(1)
      this.at++
      this.open.push(code === LIST ? { list: [], fields: null, name: '' } : { list: null, fields: new Map(), name: '' })
      this.next = code === LIST ? 'value or end' : 'name or end'
      return
    }
    if (code === QUOTE) return this.put(this.takeText())
    SCALAR.lastIndex = this.at
    const [token] = SCALAR.exec(this.text) ?? this.missing('a value')
    this.at += token.length
    this.put(token === 'true' ? true : token === 'false' ? false : token === 'null' ? null : Number(token))
  }

  /** Takes a list or object that ends soon. Where it does not parse, its parts are taken one by one, to find the place. */
  private takeWhole(): boolean {
    const { text, at } = this
    const last = Math.min(text.length, at + WINDOW)
    const depthHere = this.open.length
    let depth = 0
    let parts = 0
    for (let place = at; place < last; place++) {
      const code = text.charCodeAt(place)
      if (code === QUOTE) {
        parts++
        for (place++; place < last && text.charCodeAt(place) !== QUOTE; place++) if (text.charCodeAt(place) === BACKSLASH) place++
      } else if (code === LIST || code === OBJECT) {
        parts++
        if (depthHere + ++depth > MOST_DEPTH) refuse(`is nested deeper than ${MOST_DEPTH} levels`)
      } else if ((code === LIST_END || code === OBJECT_END) && --depth === 0) {
        try {
          const value: unknown = JSON.parse(text.slice(at, place + 1))
          this.count(parts)
          this.at = place + 1
          this.put(value)
          return true
        } catch (error) {
          if (error instanceof SyntaxError) return false
          throw error
        }
      }
    }
    return false
  }

  private takeText(): string {
    const { text, at } = this
    let end = at
    for (let escapes = 1; escapes % 2 === 1; ) {
      end = text.indexOf('"', end + 1)
      if (end === -1) break
      for (escapes = 0; text.charCodeAt(end - 1 - escapes) === BACKSLASH; ) escapes++
    }
    if (end - at > MOST_CHARACTERS) refuse(`holds a text of more than ${MOST_CHARACTERS} characters`)
    this.count(1)
    try {
      if (end === -1) throw new SyntaxError('the text does not end')
      const value = JSON.parse(text.slice(at, end + 1)) as string
      this.at = end + 1
      return value
    } catch (error) {
      if (error instanceof SyntaxError) fail('malformed-body', `The body is not JSON: the text that begins at character ${at + 1} is not written as JSON writes texts, or does not end.`)
      throw error
    }
  }

  private takeName(code: number): void {
    if (code !== QUOTE) this.missing('a name in double quotes')
    this.open.at(-1)!.name = this.takeText()
    this.next = 'colon'
  }

  private takeColon(code: number): void {
    if (code !== COLON) this.missing('a colon')
    this.at++
    this.next = 'value'
  }

  private takeComma(code: number): void {
    const { list } = this.open.at(-1)!
    if (code === (list === null ? OBJECT_END : LIST_END)) return this.close()
    if (code !== COMMA) this.missing(`a comma or ${list === null ? 'a closing brace' : 'a closing bracket'}`)
    this.at++
    this.next = list === null ? 'name' : 'value'
  }

  private close(): void {
    const { list, fields } = this.open.pop()!
    this.at++
    // A name like __proto__ becomes a field like any other here.
    this.put(list ?? Object.fromEntries(fields!))
  }

  private put(value: unknown): void {
    const into = this.open.at(-1)
    this.next = into === undefined ? 'nothing' : 'comma or end'
    if (into === undefined) this.value = value
    else if (into.list === null) into.fields!.set(into.name, value)
    else if (into.list.push(value) > MOST_ENTRIES) refuse(`holds a list of more than ${MOST_ENTRIES} entries`)
  }
}

/** Parses a JSON text as JSON.parse does, pausing about every window of characters: a body of 8 MiB takes a tenth of a second and more.
 *  Fails with malformed-body and the place, or with invalid-request where the text is built to be a burden. */
export function* parseJsonInSteps(text: string): Generator<void, unknown> {
  const reader = new JsonReader(text)
  for (let paused = 0; reader.next !== 'done'; ) {
    reader.step()
    if (reader.at - paused < WINDOW) continue
    paused = reader.at
    yield
  }
  return reader.value
}
