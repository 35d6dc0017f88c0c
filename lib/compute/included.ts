/** Which result fields are wanted: those named, or all but those that only come when asked for. */
export function includedFields<F extends string>(all: readonly F[], named: readonly F[] | undefined, onlyWhenAsked: readonly F[] = []): ReadonlySet<F> {
  return new Set(named ?? all.filter((field) => !onlyWhenAsked.includes(field)))
}

/** A result with the wanted fields only; each is worked out only when it is wanted. */
export function pick<T extends object>(wanted: ReadonlySet<string>, fields: { readonly [F in keyof T]: () => T[F] }): Partial<T> {
  const result: Partial<T> = {}
  for (const name of Object.keys(fields) as (keyof T & string)[]) if (wanted.has(name)) result[name] = fields[name]()
  return result
}
