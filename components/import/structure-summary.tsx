import { JointsTable } from '@/components/sheet/joints-table'
import { jointRowsOf } from '@/components/sheet/joint-rows'
import { Fingerprint } from '@/components/ui/fingerprint'
import { UnitSwitch } from '@/components/ui/unit-switch'
import type { Structure } from '@/lib/contract/description'

/** What the importer read out of a file, before anything is stored. */
export function StructureSummary({ structure }: { readonly structure: Structure }) {
  const { counts, robotName, rootLink, fingerprint } = structure
  const chain = structure.chains.find((one) => one.default)
  const facts = [
    ['Robot', robotName || 'unnamed'],
    ['Root link', rootLink],
    ['Links', String(counts.links)],
    ['Joints', String(counts.joints)],
    ['Independent', String(counts.independent)],
  ] as const
  return (
    <div className="space-y-4">
      <dl className="grid grid-cols-2 gap-x-6 gap-y-2 tablet:grid-cols-3">
        {facts.map(([label, value]) => (
          <div key={label} className="min-w-0">
            <dt className="label">{label}</dt>
            <dd className="num break-all">
              <bdi>{value}</bdi>
            </dd>
          </div>
        ))}
        <div className="max-tablet:col-span-2">
          <dt className="label">Fingerprint</dt>
          <dd>
            <Fingerprint value={fingerprint} />
          </dd>
        </div>
      </dl>
      {chain === undefined ? (
        <p className="text-soft">No chain of this robot can be computed: a floating or planar joint stands in the way of every one, or nothing moves.</p>
      ) : (
        <div>
          <div className="flex flex-wrap items-baseline justify-between gap-x-4">
            <p className="min-w-0 break-words">
              Default chain, <code>{chain.base}</code> to <code>{chain.tip}</code>
            </p>
            <UnitSwitch />
          </div>
          <JointsTable rows={jointRowsOf(structure.joints, chain.joints)} />
        </div>
      )}
    </div>
  )
}
