/** Address of the comparison of two revisions, between two links where they are named. */
export function comparisonHref(team: string, model: string, from: number, to: number, chain: { base?: string | undefined; tip?: string | undefined } = {}): string {
  const search = new URLSearchParams({ from: String(from), to: String(to) })
  for (const end of ['base', 'tip'] as const) if (chain[end] !== undefined) search.set(end, chain[end])
  return `/teams/${team}/models/${model}/comparison?${search}`
}
