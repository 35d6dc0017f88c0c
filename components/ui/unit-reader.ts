import { create, unitDependencies } from 'mathjs'

// The package declares each set of dependencies as possibly absent.
const { unit } = create(unitDependencies ?? {})

/** The SI value of a text such as "170 deg" or "0.35 m" as an angle (rad) or a length (m); null when it is not one.
 *  Heavy: load it only when somebody typed a unit. */
export function siFromText(text: string, kind: 'angle' | 'length'): number | null {
  try {
    const value = unit(text).toNumber(kind === 'angle' ? 'rad' : 'm')
    return typeof value === 'number' && Number.isFinite(value) ? value : null
  } catch {
    // mathjs throws on unknown units and on units of another kind alike; both mean that it cannot be read here.
    return null
  }
}
