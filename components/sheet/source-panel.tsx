import { addressOf } from '@/components/api/address'
import { revisionHref } from '@/components/import/revision-href'
import { ButtonLink } from '@/components/ui/button-link'
import { buttonLook } from '@/components/ui/button-look'
import { CopyButton } from '@/components/ui/copy-button'

interface SourcePanelProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  readonly fileName: string
  /** Of an archive: path of the description in it. */
  readonly entry: string | undefined
  readonly sourceDigest: string
  readonly fingerprint: string
}

/** The file behind a revision: to look at, to take away, and the two digests that prove it. */
export function SourcePanel({ path, fileName, entry, sourceDigest, fingerprint }: SourcePanelProps) {
  const digests = [
    { label: 'Fingerprint, over the kinematic content', value: fingerprint, what: 'fingerprint' },
    { label: 'Source digest, over the file as uploaded', value: sourceDigest, what: 'source digest' },
  ]
  return (
    <section aria-labelledby="sheet-source">
      <h2 id="sheet-source">Source</h2>
      <p className="num mt-1 break-all">
        <bdi dir="ltr">{fileName}</bdi>
        {entry === undefined ? null : (
          <>
            {' · '}
            <bdi dir="ltr">{entry}</bdi>
          </>
        )}
      </p>
      <dl className="mt-2 space-y-2">
        {digests.map(({ label, value, what }) => (
          <div key={what}>
            <dt className="label">{label}</dt>
            <dd className="num break-all">
              {value} <CopyButton text={value} what={what} />
            </dd>
          </div>
        ))}
      </dl>
      <div data-screen-only className="mt-3 flex flex-wrap gap-3">
        <ButtonLink href={`${revisionHref(path.team, path.model, path.revision)}/source`}>Source and findings</ButtonLink>
        <a href={addressOf('getSource', path)} download={fileName} className={buttonLook('plain')}>
          Download
        </a>
        <a href={addressOf('exportModel', path)} download className={buttonLook('plain')}>
          Export the model
        </a>
      </div>
    </section>
  )
}
