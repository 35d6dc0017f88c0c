/** Which result fields are wanted: those named, or all but those that only come when asked for. */
export function includedFields<F extends string>(all: readonly F[], named: readonly F[] | undefined, onlyWhenAsked: readonly F[] = []): Set<F> {
  return new Set(named ?? all.filter((field) => !onlyWhenAsked.includes(field)))
}

/** The wanted fields in the order of the declaration. */
export const inOrder = <F extends string>(all: readonly F[], wanted: ReadonlySet<F>): F[] => all.filter((field) => wanted.has(field))

/** A result with the wanted fields only; each is worked out only when it is wanted. */
export function pick<T extends object>(wanted: ReadonlySet<string>, fields: { readonly [F in keyof T]: () => T[F] }): Partial<T> {
  const result: Partial<T> = {}
  for (const name of Object.keys(fields) as (keyof T & string)[]) if (wanted.has(name)) result[name] = fields[name]()
  return result
}
