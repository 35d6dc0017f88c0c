import clsx from 'clsx'
import { seededConfigurations } from '@/lib/kinematics/seeded-configurations'
import type { Chain } from '@/lib/kinematics/chain'
import { drawingOrder } from './drawing-order'
import { fitInto, type Box } from './fit'
import { GroundGrid } from './ground-grid'
import { onPaper } from './on-paper'
import { PieceShape, type Paper } from './piece-shape'
import { linkLength, outlineOf, piecesOf, spanOf, tipFrame } from './pieces'
import { skeletonOf, type Skeleton } from './skeleton'
import type { Vector } from './vector'
import { defaultView, projection, type View } from './view'

interface ArmDrawingProps {
  readonly chain: Chain
  /** The configuration drawn: n, rad or m. */
  readonly q: readonly number[]
  /** What the drawing shows, for those who do not see it. */
  readonly label: string
  /** Proportions of the picture; it takes the width that it is given. */
  readonly width?: number
  readonly height?: number
  readonly view?: View
  /** pose: as large as this pose allows. reach: the same size for every pose, for an arm that moves. */
  readonly room?: 'pose' | 'reach'
  /** Further configurations, drawn pale behind the arm. */
  readonly ghosts?: readonly (readonly number[])[]
  readonly className?: string
}

/** What can be reached needs less room around it: the arm is seldom at its edge. */
const MARGINS = { pose: 0.13, reach: 0.03 } as const

const REACH_SAMPLES = 48
const reaches = new WeakMap<Chain, Vector[]>()

/** Where the arm can go, above the floor. */
function reachOf(chain: Chain): Vector[] {
  const known = reaches.get(chain)
  if (known !== undefined) return known
  const points = seededConfigurations(chain, REACH_SAMPLES).flatMap((q) => outlineOf(skeletonOf(chain, q)))
  const above = points.filter((point) => point[2] >= -1e-6)
  reaches.set(chain, above)
  return above
}

function Arm({ skeleton, paper }: { readonly skeleton: Skeleton; readonly paper: Paper }) {
  return drawingOrder(piecesOf(skeleton), paper).map(({ piece, key }) => <PieceShape key={key} piece={piece} paper={paper} />)
}

/** The arm as lines on paper: orthographic, from the same kinematics as every number of the product. Drawn on the server or, live,
 *  in the browser. Its letters are text of the page, so that they stay readable at any size. */
export function ArmDrawing({ chain, q, label, width = 860, height = 760, view, room = 'pose', ghosts = [], className }: ArmDrawingProps) {
  const box: Box = { width, height }
  const project = projection(view ?? defaultView(chain))
  const skeleton = skeletonOf(chain, q)
  const frameArm = 0.12 * spanOf(skeleton)
  const arrows = tipFrame(skeleton, frameArm)
  const outline = room === 'reach' ? reachOf(chain) : [...outlineOf(skeleton), ...arrows]
  const fit = fitInto(box, outline, project, linkLength(piecesOf(skeleton)), MARGINS[room])
  const paper: Paper = { project, fit }
  const tip = fit.place(project(skeleton.tip))
  const heads = arrows.map((arrow) => fit.place(project(arrow)))
  return (
    <div className={clsx('relative w-full', className)} style={{ aspectRatio: `${width} / ${height}` }}>
      <svg viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label} className="absolute inset-0 size-full overflow-hidden">
        <GroundGrid points={outline} project={project} fit={fit} />
        {ghosts.map((ghost, place) => (
          <g key={place} className="text-blue" opacity={0.28} stroke="currentColor" fill="var(--sheet)" strokeLinejoin="round">
            <Arm skeleton={skeletonOf(chain, ghost)} paper={paper} />
          </g>
        ))}
        <g className="text-ink" stroke="currentColor" fill="var(--sheet)" strokeLinejoin="round">
          <Arm skeleton={skeleton} paper={paper} />
        </g>
        <path
          d={heads.map((head) => `M${tip.map((v) => onPaper(v)).join(' ')}L${head.map((v) => onPaper(v)).join(' ')}`).join('')}
          stroke="var(--blue)"
          strokeWidth={2}
          fill="none"
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      {heads.map(([x, y], axis) => (
        <span
          key={axis}
          aria-hidden
          className="num pointer-events-none absolute -translate-y-1/2 text-12 text-blue"
          style={{ left: `calc(${onPaper((100 * x) / width)}% + 4px)`, top: `${onPaper((100 * y) / height)}%` }}
        >
          {['X', 'Y', 'Z'][axis]}
        </span>
      ))}
    </div>
  )
}
