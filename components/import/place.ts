/** A place in a source, counted from 1 in lines and characters (code points). */
export interface Place {
  readonly line: number
  readonly column: number
}

/** The line that an address such as `…/source#L112` asks for; null when it asks for none. */
export function lineOfAnchor(hash: string): number | null {
  const digits = /^#L(\d{1,7})$/.exec(hash)?.[1]
  return digits === undefined || Number(digits) < 1 ? null : Number(digits)
}
