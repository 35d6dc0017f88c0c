interface Reviewed {
  readonly independent: number
  readonly inForce?: { readonly revision: number; readonly independent: number; readonly sameNumbers: boolean }
}

/** What a revision in review would change, in a sentence. */
export function whatChanged({ independent, inForce }: Reviewed): string {
  if (inForce === undefined) return 'Nothing is in force yet: it would be the first.'
  const former = `revision ${inForce.revision}, which is in force`
  if (inForce.sameNumbers) return `It computes the same numbers as ${former}.`
  const joints = independent === inForce.independent ? '' : `, and has ${independent} independent ${independent === 1 ? 'joint' : 'joints'} instead of ${inForce.independent}`
  return `It computes other numbers than ${former}${joints}.`
}
