import { Fingerprint } from '@/components/ui/fingerprint'
import { StatusMark } from '@/components/ui/status-mark'
import { TextLink } from '@/components/ui/text-link'
import { TitleBlock, TitleCell } from '@/components/ui/title-block'
import type { Comparison } from '@/lib/contract/comparison'

interface ComparisonTitleBlockProps {
  readonly modelName: string
  readonly comparison: Comparison
  readonly href: (revision: number) => string
}

/** The title block of a comparison: which two revisions, and between which links. */
export function ComparisonTitleBlock({ modelName, comparison: { from, to, chain, effect }, href }: ComparisonTitleBlockProps) {
  const sides = [
    { label: 'From revision', ...from },
    { label: 'To revision', ...to },
  ]
  return (
    <TitleBlock label="Title block">
      <TitleCell label="Model" span={6}>
        <bdi className="block text-left text-18 break-words">{modelName}</bdi>
      </TitleCell>
      {sides.map(({ label, revision, status }) => (
        <TitleCell key={label} label={label} span={3}>
          <span className="flex flex-wrap items-baseline gap-x-3">
            <TextLink href={href(revision)} className="num px-1">
              {revision}
            </TextLink>
            <StatusMark status={status} />
          </span>
        </TitleCell>
      ))}
      {sides.map(({ label, fingerprint }) => (
        <TitleCell key={label} label={`Fingerprint, ${label.toLowerCase()}`} span={6}>
          <Fingerprint value={fingerprint} />
        </TitleCell>
      ))}
      <TitleCell label="Chain" span={4}>
        <span className="num break-all">
          <bdi>{chain.base}</bdi> to <bdi>{chain.tip}</bdi>
        </span>
      </TitleCell>
      <TitleCell label="Configurations compared" className="max-tablet:col-span-6">
        <span className="num">{effect.samples}</span>
      </TitleCell>
    </TitleBlock>
  )
}
