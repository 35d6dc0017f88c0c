import Form from 'next/form'
import { Button } from '@/components/ui/button'
import { controlLook } from '@/components/ui/field'
import { TextLink } from '@/components/ui/text-link'
import type { Chain } from '@/lib/contract/description'

/** Longer lists would hold up the browser; the two fields take any link. */
const MOST_OFFERED = 500
const MOST_CHAINS = 8

interface ChainChooserProps {
  /** Address of the sheet without a chain. */
  readonly href: string
  readonly chains: readonly Chain[]
  readonly links: readonly { readonly name: string }[]
  readonly base: string
  readonly tip: string
  /** Why the chain asked for is not shown. */
  readonly refusal?: string | undefined
}

/** Chooses the two links between which the sheet is drawn: one of the chains to the leaves, or any two. Works without script. */
export function ChainChooser({ href, chains, links, base, tip, refusal }: ChainChooserProps) {
  return (
    <section aria-labelledby="sheet-chain" data-screen-only>
      <h2 id="sheet-chain">Chain</h2>
      {refusal === undefined ? null : (
        <p role="alert" className="mt-1 font-medium text-verm">
          {refusal}
        </p>
      )}
      <ul className="mt-1 border-t border-ink">
        {chains.slice(0, MOST_CHAINS).map((chain) => (
          <li key={`${chain.base} ${chain.tip}`} className="flex flex-wrap items-baseline gap-x-4 border-b border-hair px-2 py-1.5">
            <TextLink
              href={chain.default ? href : `${href}?${new URLSearchParams({ base: chain.base, tip: chain.tip })}`}
              aria-current={chain.base === base && chain.tip === tip ? 'true' : undefined}
              className="num min-w-0 break-all"
              scroll={false}
            >
              <bdi>{chain.base}</bdi> to <bdi>{chain.tip}</bdi>
            </TextLink>
            <span className="label">
              {chain.joints.length} {chain.joints.length === 1 ? 'joint' : 'joints'}
              {chain.default ? ', default' : ''}
              {chain.base === base && chain.tip === tip ? ', shown' : ''}
            </span>
          </li>
        ))}
      </ul>
      {chains.length > MOST_CHAINS ? <p className="label mt-1">{chains.length - MOST_CHAINS} further leaves can be named below.</p> : null}
      <Form action={href} scroll={false} className="mt-3 flex flex-wrap items-end gap-3">
        <LinkField name="base" label="Base link" value={base} />
        <LinkField name="tip" label="Tip link" value={tip} />
        <datalist id="links-of-model">
          {links.slice(0, MOST_OFFERED).map(({ name }) => (
            <option key={name} value={name} />
          ))}
        </datalist>
        <Button type="submit">Show chain</Button>
      </Form>
    </section>
  )
}

function LinkField({ name, label, value }: { readonly name: string; readonly label: string; readonly value: string }) {
  return (
    <label className="min-w-40 flex-1">
      <span className="mb-1 block font-semibold">{label}</span>
      <input key={value} name={name} defaultValue={value} list="links-of-model" required autoComplete="off" spellCheck={false} className={controlLook(undefined, 'num')} />
    </label>
  )
}
