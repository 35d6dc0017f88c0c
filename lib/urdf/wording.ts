const LONGEST_VALUE = 80
const LONGEST_LIST = 50

/** A value met in a file, in quotes, cut when it is long. */
export function quoted(value: string): string {
  const characters = [...value.slice(0, 4 * LONGEST_VALUE)]
  return characters.length > LONGEST_VALUE ? `'${characters.slice(0, LONGEST_VALUE).join('')}…'` : `'${value}'`
}

/** `'a', 'b' and 'c'`; a long list ends in "and 12 more". note: what to say behind each name. */
export function listed(names: readonly string[], note: (index: number) => string = () => ''): string {
  const shown = names.slice(0, LONGEST_LIST).map((name, index) => quoted(name) + note(index))
  if (names.length > LONGEST_LIST) return `${shown.join(', ')} and ${names.length - LONGEST_LIST} more`
  return shown.length < 2 ? shown.join('') : `${shown.slice(0, -1).join(', ')} and ${shown.at(-1)}`
}
