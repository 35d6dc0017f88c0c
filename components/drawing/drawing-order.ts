import type { Paper } from './piece-shape'
import type { Piece } from './pieces'

/** How near to the eye a piece lies by itself. */
function nearness(piece: Piece, { project, fit }: Paper): number {
  const lift = fit.thickness / fit.scale
  switch (piece.kind) {
    case 'link':
      return (project(piece.from).near + project(piece.to).near) / 2
    case 'rail':
    case 'way':
      return Math.min(project(piece.from).near, project(piece.to).near) - lift
    case 'base':
      return project(piece.at).near - lift
    default:
      return project(piece.at).near
  }
}

/** The pieces in the order in which they are drawn: far ones first, and a joint over the links that meet in it. */
export function drawingOrder(pieces: readonly Piece[], paper: Paper): { readonly piece: Piece; readonly key: number }[] {
  const near = pieces.map((piece) => nearness(piece, paper))
  const linkAt = (places: readonly number[]) => places.find((place) => pieces[place]?.kind === 'link')
  const over = pieces.map((piece, place) => {
    if (piece.kind !== 'drum' && piece.kind !== 'band' && piece.kind !== 'block') return near[place]!
    const before = linkAt(Array.from({ length: place }, (_, i) => place - 1 - i))
    const after = linkAt(Array.from({ length: pieces.length - place - 1 }, (_, i) => place + 1 + i))
    const least = [before, after].flatMap((link) => (link === undefined ? [] : [near[link]!]))
    return Math.max(near[place]!, ...least) + 1e-6
  })
  return pieces.map((piece, key) => ({ piece, key })).sort((a, b) => over[a.key]! - over[b.key]!)
}
