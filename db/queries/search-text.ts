/** Letters that no decomposition takes apart, and how they are typed without a keyboard that has them (common practice). */
const LETTERS: Readonly<Record<string, string>> = { ß: 'ss', ς: 'σ', æ: 'ae', œ: 'oe', ø: 'o', ł: 'l', đ: 'd', ð: 'd', þ: 'th', ı: 'i' }

/** A text as the register compares it: without case, accents, vowel points, compatibility forms (full width, ligatures) and
 *  characters that nobody sees, and with one space where there is any blank. */
export const foldText = (text: string): string =>
  text
    .normalize('NFKD')
    .replace(/[\p{Mn}\p{Cf}]/gu, '')
    .toLowerCase()
    .replace(/[ßςæœøłđðþı]/g, (letter) => LETTERS[letter]!)
    .replace(/[\s\p{Cc}]+/gu, ' ')
    .trim()

/** What is searched of a model, a line for each part: what is looked for has no line breaks, so it is found inside a part only. */
export const searchTextOf = (parts: readonly (string | null)[]): string => parts.flatMap((part) => (part === null ? [] : [foldText(part)])).join('\n')
