/** How long an answer about a key or a session may be reused: an ended one is refused within this time on every process. */
export const BRIEF_MS = 2000
const MOST_ENTRIES = 10_000

/** Remembers what `load` answered for BRIEF_MS, so that a burst of calls asks the database once. */
export function briefCache<T>(load: (id: string) => Promise<T>) {
  const entries = new Map<string, { value: Promise<T>; until: number }>()
  return {
    get(id: string): Promise<T> {
      const now = Date.now()
      const known = entries.get(id)
      if (known !== undefined && known.until > now) return known.value
      if (entries.size >= MOST_ENTRIES) entries.clear()
      const value = load(id)
      entries.set(id, { value, until: now + BRIEF_MS })
      value.catch(() => entries.delete(id))
      return value
    },
    forget: (id: string) => void entries.delete(id),
  }
}

// One cache a process, though its bundles load this module several times.
const shared = globalThis as unknown as { elbowroomCaches?: Map<string, unknown> }

/** The process's one cache of this name. */
export function sharedBriefCache<T>(name: string, load: (id: string) => Promise<T>): ReturnType<typeof briefCache<T>> {
  shared.elbowroomCaches ??= new Map()
  const known = shared.elbowroomCaches.get(name)
  if (known !== undefined) return known as ReturnType<typeof briefCache<T>>
  const cache = briefCache(load)
  shared.elbowroomCaches.set(name, cache)
  return cache
}
