import type { Revision } from '@/lib/contract/model'
import { StructureTable } from './structure-table'

/** Everything in the robot's tree, whatever the chain shown. */
export function StructurePanel({ rootLink, joints, counts, robotName }: Pick<Revision, 'rootLink' | 'joints' | 'counts' | 'robotName'>) {
  return (
    <section aria-labelledby="sheet-structure" className="mt-8">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="sheet-structure">Structure</h2>
        <span className="label min-w-0 [overflow-wrap:anywhere]">
          {robotName === '' ? 'unnamed robot' : <>robot “<bdi>{robotName}</bdi>”</>} · {counts.links} links · {counts.joints} joints · {counts.independent} independent
        </span>
      </div>
      <StructureTable rootLink={rootLink} joints={joints} />
    </section>
  )
}
