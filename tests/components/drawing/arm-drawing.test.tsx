import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { ArmDrawing } from '@/components/drawing/arm-drawing'
import { postureToDraw } from '@/components/drawing/posture-to-draw'
import { seededConfigurations } from '@/lib/kinematics/seeded-configurations'
import { listViolations } from '@/lib/kinematics/within-limits'
import { longChain, pointChain, SAMPLE_FILES, sampleChain } from './sample-chains'

const CHAINS = [
  ...SAMPLE_FILES.map((file) => ({ name: file, chain: sampleChain(file) })),
  { name: '100 joints', chain: longChain(100) },
  { name: 'three joints in one point', chain: pointChain(3) },
  { name: 'no joint', chain: pointChain(0) },
]

/** Every coordinate in the paths of a drawing. */
const coordinates = (html: string): number[] =>
  [...html.matchAll(/ d="([^"]*)"/g)].flatMap(([, path]) => (path!.match(/-?[\d.]+(?:e-?\d+)?|NaN|Infinity/g) ?? []).map(Number))

describe.each(CHAINS)('the drawing of $name', ({ chain }) => {
  const q = postureToDraw(chain)

  it('shows a pose within the limits', () => {
    expect(q).toHaveLength(chain.joints.length)
    expect(listViolations(chain, q)).toEqual([])
  })

  it('keeps the arm inside the picture, with finite numbers only', () => {
    const html = renderToStaticMarkup(<ArmDrawing chain={chain} q={q} label="arm" width={860} height={760} />)
    expect(html).not.toMatch(/NaN|Infinity|undefined/)
    // The floor may run out of the picture; the arm, drawn in the group of ink, may not.
    const arm = html.slice(html.indexOf('text-ink'))
    const numbers = coordinates(arm)
    expect(numbers.length).toBeGreaterThan(0)
    for (const number of numbers) expect(Math.abs(number - 400)).toBeLessThan(480)
  })

  it('has the same size in every pose when it is given room to move', () => {
    const floor = (pose: ArrayLike<number>) => {
      const html = renderToStaticMarkup(<ArmDrawing chain={chain} q={[...Array.from(pose)]} label="arm" room="reach" />)
      expect(html).not.toMatch(/NaN|Infinity|undefined/)
      return / d="([^"]*)"/.exec(html)![1]
    }
    const [first, ...others] = seededConfigurations(chain, 4, 5).map(floor)
    for (const other of others) expect(other).toBe(first)
  })
})
