/** The lexical form of an XML Schema double without its special values: locale-free, a point and never a comma. */
const NUMBER = /^[+-]?(?:[0-9]+(?:\.[0-9]*)?|\.[0-9]+)(?:[eE][+-]?[0-9]+)?$/

/** Reads `count` numbers separated by XML white space, each of a magnitude up to `largest`; -0 becomes 0.
 *  Answers what is wrong, as the end of a sentence that begins with the value, where they cannot be read. */
export function readNumbers(text: string, count: number, largest: number): readonly number[] | { readonly wrong: string } {
  const words = text.split(/[ \t\r\n]+/).filter((word) => word !== '')
  const bad = words.find((word) => !NUMBER.test(word))
  if (bad !== undefined) return { wrong: `${whatIsWrong(bad)}` }
  if (words.length !== count) return { wrong: `has ${words.length} ${words.length === 1 ? 'number' : 'numbers'} where ${count} ${count === 1 ? 'is' : 'are'} expected` }
  const numbers = words.map((word) => Number(word) + 0)
  const large = numbers.findIndex((value) => Math.abs(value) > largest)
  if (large !== -1) return { wrong: `has the number ${clip(words[large]!)}, which is too large to compute with (beyond ${largest.toExponential().replace('+', '')})` }
  return numbers
}

const clip = (word: string): string => (word.length > 40 ? `${[...word].slice(0, 40).join('')}…` : word)

function whatIsWrong(word: string): string {
  const shown = `'${clip(word)}'`
  if (/^[+-]?nan$/i.test(word)) return `has ${shown}, which is not a number`
  if (/^[+-]?inf(inity)?$/i.test(word)) return `has ${shown}; infinity is not a number to compute with`
  if (/^[+-]?0x/i.test(word)) return `has ${shown}; hexadecimal numbers are not read`
  if (/^[+-]?[0-9]*,[0-9]+([eE][+-]?[0-9]+)?$/.test(word)) return `has ${shown} with a decimal comma`
  return `has ${shown}, which is not a decimal number`
}
