import type { Metadata } from 'next'
import { CodeBlock } from '@/components/docs/code-block'
import { DocsPage } from '@/components/docs/docs-page'
import { FactTable } from '@/components/docs/fact-table'
import { TextLink } from '@/components/ui/text-link'
import { MESH_MEDIA_TYPES } from '@/lib/contract/mesh-media-types'

export const metadata: Metadata = { title: 'Archives and export' }

const ENDS = Object.keys(MESH_MEDIA_TYPES).map((end) => `.${end}`)

const page = (rule: string) => (
  <TextLink key={rule} href={`/docs/findings/${rule}`}>
    {rule}
  </TextLink>
)

export default function ArchivesPage() {
  return (
    <DocsPage href="/docs/archives" title="Archives and export" lead="A description with its meshes goes in as one .zip, and all that is known of a model comes out as one.">
      <h2>Sending an archive</h2>
      <p>
        Where a description is sent, a <code>.zip</code> of it with its meshes may be sent instead, up to 64 MiB. The archive is kept byte for byte and is the
        source of the revision; the meshes in it can be had one by one. Kept beside the description are files that end in {ENDS.join(', ')}. The rest
        stays in the archive, and a note says so.
      </p>
      <CodeBlock
        title="An archive as a new model"
        code={`curl -sS "$ELBOWROOM_URL/api/v1/teams/tarnholm/models" \\
  -H "Authorization: Bearer $ELBOWROOM_KEY" \\
  -F name="Skerry 7" -F entry="arm/urdf/arm.urdf" -F file=@arm.zip`}
      />
      <p>
        The field <code>entry</code> is needed only where the archive has several descriptions; without it the import is refused, and the answer lists them under{' '}
        <code>descriptions</code>. A description is a file that ends in <code>.urdf</code> or, where there is none, an <code>.xml</code> file that begins with a robot.
      </p>

      <h2>Where a mesh is found</h2>
      <FactTable
        caption="How the filename of a mesh is resolved"
        heads={['Written', 'Found']}
        rows={[
          [<code key="p">package://name/meshes/base.stl</code>, 'The file whose path ends in most of these parts; the name of the package need not be a folder in the archive.'],
          [<code key="r">meshes/base.stl</code>, 'The file whose path ends so, whatever folders stand before it. Of several the shortest path is taken.'],
          [<code key="o">../base.stl, /srv/base.stl, http:…</code>, 'Never followed: outside the archive.'],
        ]}
      />
      <p>A mesh that is not found changes no number. Upper and lower case count.</p>

      <h2>What refuses an archive</h2>
      <FactTable
        caption="Rules of archives"
        heads={['Rule', 'When']}
        rows={[
          [page('archive-path-unsafe'), 'A path leads out of the archive, or is none.'],
          [page('archive-link'), 'An entry is a link or a device.'],
          [page('archive-encrypted'), 'A password is asked for.'],
          [page('archive-packing-unknown'), 'An entry is packed by another method than deflate.'],
          [page('archive-too-many-entries'), 'More than 2000 entries.'],
          [page('archive-too-large'), 'More than 256 MiB unpacked.'],
          [page('archive-ratio'), 'An entry, or all of it, unpacks to more than 200 times its size.'],
          [page('archive-nested'), 'An archive is in the archive.'],
          [page('archive-name-twice'), 'Two names that some system takes for one.'],
          [page('archive-headers-differ'), 'The archive says two things of one entry, or another size than it has.'],
          [page('archive-malformed'), 'It is cut off, damaged or followed by other bytes.'],
        ]}
      />
      <p>
        All but the last two, and an inner archive under another name, are told from the directory of the archive, before anything is unpacked.
      </p>

      <h2>Taking everything out</h2>
      <p>
        The export of a model is a zip of all its revisions: each file as it was uploaded, the findings, the history, the canonical JSON whose SHA-256 is the
        fingerprint, the meshes, reference poses and check vectors, and a <code>manifest.json</code> with the SHA-256 of every file. A <code>README.txt</code> in it
        says what is what. Import the source again, here or elsewhere, and it has the same fingerprint. The same model gives the same bytes, so that two
        exports can be compared by their digest. No secret is in it.
      </p>
      <CodeBlock
        title="Export a model"
        code={`curl -sS -o skerry-7-export.zip "$ELBOWROOM_URL/api/v1/teams/tarnholm/models/skerry-7/export" \\
  -H "Authorization: Bearer $ELBOWROOM_KEY"`}
      />

      <h2>Who uses a model</h2>
      <p>
        Of each key it is kept which revision it called and when it last did, at most once a minute; the sheet shows it, and{' '}
        <code>GET /teams/&#123;team&#125;/models/&#123;model&#125;/used-by</code> lists it. Of people no such record is kept.
      </p>
    </DocsPage>
  )
}
