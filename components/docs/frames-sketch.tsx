import { radFromDeg } from '@/lib/units'

const line = { fill: 'none', strokeWidth: 1.6 } as const

/** A right-handed frame drawn in three strokes; x to the reader's right unless turned. */
function Axes({ x, y, turn = 0, name, labelX = 10, labelY = 22 }: { x: number; y: number; turn?: number; name: string; labelX?: number; labelY?: number }) {
  const ends = [
    { letter: 'x', dx: 46, dy: 10 },
    { letter: 'y', dx: 28, dy: -26 },
    { letter: 'z', dx: 0, dy: -50 },
  ]
  const angle = radFromDeg(turn)
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  return (
    <g>
      {ends.map(({ letter, dx, dy }) => {
        const ex = Math.round(x + dx * cos - dy * sin)
        const ey = Math.round(y + dx * sin + dy * cos)
        const tx = Math.round(x + 1.22 * (dx * cos - dy * sin))
        const ty = Math.round(y + 1.22 * (dx * sin + dy * cos))
        return (
          <g key={letter}>
            <path d={`M${x} ${y}L${ex} ${ey}`} stroke="var(--blue)" strokeWidth={2} fill="none" markerEnd="url(#frame-head)" />
            <text x={tx} y={ty + 5} textAnchor="middle" className="num" fill="var(--blue)" stroke="none" fontSize={15}>
              {letter}
            </text>
          </g>
        )
      })}
      <circle cx={x} cy={y} r={3} fill="var(--blue)" />
      <text x={x + labelX} y={y + labelY} fontSize={15} fontWeight={600} fill="var(--ink)" stroke="none">
        {name}
      </text>
    </g>
  )
}

/** The frames of a chain and a twist at the tool point, as a drawing. */
export function FramesSketch() {
  return (
    <figure className="max-w-3xl">
      <div className="scroll-x" tabIndex={0} role="group" aria-label="Sketch of the frames">
      <svg
        viewBox="0 0 760 380"
        role="img"
        aria-labelledby="frames-sketch-title"
        className="block w-full min-w-[40rem] border border-hair bg-sheet font-sans"
        stroke="var(--ink)"
        strokeLinejoin="round"
      >
        <title id="frames-sketch-title">
          An arm with three frames: base at its foot, tip at its flange, tool at the end of the tool. At the tool point a straight arrow shows the linear
          velocity and a curved arrow the angular velocity.
        </title>
        <defs>
          <marker id="frame-head" viewBox="0 0 8 8" refX={7} refY={4} markerWidth={5} markerHeight={5} orient="auto-start-reverse">
            <path d="M0 0 8 4 0 8z" fill="var(--blue)" stroke="none" />
          </marker>
          <marker id="twist-head" viewBox="0 0 8 8" refX={7} refY={4} markerWidth={6} markerHeight={6} orient="auto-start-reverse">
            <path d="M0 0 8 4 0 8z" fill="var(--ink)" stroke="none" />
          </marker>
        </defs>
        <path d="M40 330h680" stroke="var(--hair)" strokeWidth={1} />
        <g fill="var(--sheet)" strokeWidth={1.6}>
          <path d="M96 330h88v-10h-20l-8-10h-32l-8 10h-20z" />
          <path d="M128 310 130 216h20l2 94z" />
          <path d="m146 190 136-96 12 17-136 96z" />
          <path d="m288 92 168 26-3 18-168-26z" />
          <path d="m452 120 52 34-8 13-52-34z" />
          <circle cx={140} cy={206} r={20} />
          <circle cx={288} cy={102} r={17} />
          <circle cx={452} cy={128} r={13} />
        </g>
        <path d="M140 310V206L288 102 452 128 500 160 566 204" strokeDasharray="10 3 2 3" strokeWidth={0.8} fill="none" />
        <path d="m500 160 66 44" {...line} strokeWidth={3} stroke="var(--soft)" />
        <Axes x={140} y={330} name="base" labelX={-4} labelY={22} />
        <Axes x={500} y={160} turn={34} name="tip" labelX={-34} labelY={30} />
        <Axes x={566} y={204} turn={34} name="tool" labelX={-46} labelY={28} />
        <path d="M566 204 688 168" stroke="var(--ink)" strokeWidth={2.4} strokeDasharray="7 4" fill="none" markerEnd="url(#twist-head)" />
        <text x={690} y={158} fontSize={15} fontWeight={600} fill="var(--ink)" stroke="none" textAnchor="middle">
          v
        </text>
        <path d="M566 204V306" stroke="var(--ink)" strokeWidth={2.4} strokeDasharray="7 4" fill="none" markerEnd="url(#twist-head)" />
        <path d="M582 266a24 9 0 1 1 -33 1" stroke="var(--ink)" strokeWidth={1.6} fill="none" markerEnd="url(#twist-head)" />
        <text x={600} y={296} fontSize={15} fontWeight={600} fill="var(--ink)" stroke="none">
          ω
        </text>
        <text x={372} y={360} fontSize={15} fill="var(--soft)" stroke="none">
          twist = [vx, vy, vz, wx, wy, wz] at the tool point
        </text>
      </svg>
      </div>
      <figcaption className="label mt-1">
        Base, tip and tool frames of a chain, and a twist at the tool point. Frames are right-handed.
      </figcaption>
    </figure>
  )
}
