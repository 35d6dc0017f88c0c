import type { Scope } from '@/lib/contract/key-operations'

/** A revision in force that a new key can be tried on. */
export interface TrialModel {
  /** Path under /api/v1. */
  readonly path: string
  readonly joints: number
}

interface Trial {
  readonly site: string
  readonly team: string
  readonly key: string
  readonly scopes: readonly Scope[]
  readonly model: TrialModel | null
}

/** A curl command that works with a new key at once; null when nothing is there that its scopes reach. */
export function firstRequest({ site, team, key, scopes, model }: Trial): string | null {
  const head = (path: string) => [`curl '${site}/api/v1${path}'`, `  -H 'Authorization: Bearer ${key}'`]
  if (scopes.includes('compute') && model !== null) {
    const configuration = Array.from({ length: model.joints }, () => 0)
    return [
      ...head(`${model.path}/forward-kinematics`),
      "  -H 'Content-Type: application/json'",
      `  -d '${JSON.stringify({ configurations: [configuration] })}'`,
    ].join(' \\\n')
  }
  return scopes.includes('catalog:read') ? head(`/teams/${team}/models`).join(' \\\n') : null
}
