'use client'
import { useDeferredValue, useMemo, useState } from 'react'
import { ArmDrawing } from '@/components/drawing/arm-drawing'
import type { Chain } from '@/lib/kinematics/chain'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { readBench } from './bench-reading'
import { JointSliders } from './joint-sliders'
import { PoseTable } from './pose-table'
import { Quality } from './quality'
import { createSelfMotion } from './self-motion'
import { SelfMotionControl } from './self-motion-control'
import { SingularValueBars } from './singular-values'

/** Steps of self-motion at which the arm is drawn pale, to show where its elbow could be. */
const GHOST_STEPS = [-100, 100] as const

/** From a side where the elbow's way is seen broadside. */
const VIEW = { azimuth: -0.6, elevation: 0.28 } as const

const distance = (a: readonly number[], b: readonly number[]): number => Math.sqrt(a.reduce((sum, value, i) => sum + (value - b[i]!) ** 2, 0))

/** A bench of one arm: joints by slider, pose and measures as numbers, and the elbow moved while the tool stands still.
 *  Computed in this browser by the core that answers the API. */
export function LiveBench({ chain, name, start }: { readonly chain: Chain; readonly name: string; readonly start: readonly number[] }) {
  // Where the joints were put, and how far the null space was followed from there.
  const [held, setHeld] = useState<readonly number[]>(start)
  const [asked, setAsked] = useState(0)
  const structural = useMemo(() => structuralLoss(chain, createTask()), [chain])
  const motion = useMemo(() => createSelfMotion(chain, held, structural), [chain, held, structural])
  const point = motion.at(asked)
  const { q } = point
  const reading = readBench(chain, q)
  const drift = distance(reading.position, readBench(chain, held).position)

  const ghostMotion = useDeferredValue(motion)
  const ghosts = useMemo(() => GHOST_STEPS.map((steps) => ghostMotion.at(steps).q), [ghostMotion])

  const moveJoint = (index: number, value: number) => {
    setHeld(q.map((old, i) => (i === index ? value : old)))
    setAsked(0)
  }
  const reset = () => {
    setHeld(start)
    setAsked(0)
  }

  return (
    <section aria-label={`Bench of ${name}`} className="frame grid desk:grid-cols-[1fr_29rem]">
      <div className="flex flex-col border-ink max-desk:border-b desk:border-r">
        <div className="flex items-baseline justify-between gap-4 px-5 pt-3">
          <h2>{name}</h2>
          <p className="label">
            Spare freedom <b className="num text-ink">{reading.nullity}</b>
          </p>
        </div>
        <ArmDrawing
          chain={chain}
          q={q}
          ghosts={ghosts}
          room="reach"
          view={VIEW}
          width={900}
          height={540}
          label={`${name} as a line drawing. Its pose is in the table of the tool pose.`}
          className="my-auto"
        />
        <SelfMotionControl point={point} drift={drift} onStep={setAsked} />
      </div>
      <div className="flex flex-col pb-3">
        <div className="flex items-baseline justify-between px-5 pt-3 pb-1">
          <h2>Joints</h2>
          <span className="flex items-baseline gap-4">
            <span className="label">deg</span>
            <button type="button" onClick={reset} className="label min-h-6 text-blue hover:underline pointer-coarse:min-h-11">
              start pose
            </button>
          </span>
        </div>
        <JointSliders chain={chain} q={q} onJoint={moveJoint} />
        <div className="px-5 pt-3">
          <div className="flex items-baseline justify-between">
            <h2>Tool pose in {chain.base}</h2>
            <span className="label">quaternion x y z w</span>
          </div>
          <PoseTable position={reading.position} quaternion={reading.quaternion} />
        </div>
        <div className="grid gap-x-6 gap-y-2 px-5 pt-3 tablet:grid-cols-2">
          <div>
            <div className="flex items-baseline justify-between">
              <h2>Singular values</h2>
              <span className="label">L = 1 m</span>
            </div>
            <SingularValueBars values={reading.singularValues} />
          </div>
          <Quality reading={reading} />
        </div>
      </div>
    </section>
  )
}
