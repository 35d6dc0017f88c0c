import clsx from 'clsx'
import { Num } from '@/components/ui/num'
import { mmFromM } from '@/lib/units'

/** The tool's pose as the API answers it: position and quaternion. */
export function PoseTable({ position, quaternion }: { readonly position: readonly number[]; readonly quaternion: readonly number[] }) {
  const cells = [
    ...['x', 'y', 'z'].map((name, i) => ({ name, unit: 'mm', value: mmFromM(position[i]!), digits: 3 })),
    ...['qx', 'qy', 'qz', 'qw'].map((name, i) => ({ name, unit: '', value: quaternion[i]!, digits: 4 })),
  ]
  return (
    <dl className="grid grid-cols-12 tablet:grid-cols-[1.4fr_1.4fr_1.4fr_1fr_1fr_1fr_1fr]">
      {cells.map((cell) => (
        <div key={cell.name} className={clsx('text-right tablet:col-span-1', cell.unit === '' ? 'col-span-3' : 'col-span-4')}>
          <dt className="label border-b border-ink px-1 py-1 font-semibold">
            {cell.name}
            {cell.unit === '' ? null : <span className="font-medium"> {cell.unit}</span>}
          </dt>
          <dd className="border-b border-hair px-1 py-1">
            <Num value={cell.value} digits={cell.digits} />
          </dd>
        </div>
      ))}
    </dl>
  )
}
