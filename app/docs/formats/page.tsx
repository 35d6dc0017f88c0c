import type { Metadata } from 'next'
import { CodeBlock } from '@/components/docs/code-block'
import { DocsPage } from '@/components/docs/docs-page'
import { FactTable } from '@/components/docs/fact-table'
import { DIAGNOSIS_CODES, INVERSE_KINEMATICS_REASONS } from '@/lib/contract/kinematic-answers'
import { KINEMATIC_OPERATIONS } from '@/lib/contract/kinematic-operations'
import type { RecordForm } from '@/lib/contract/record-form'
import { siteUrl } from '@/lib/env'
import { connection } from 'next/server'
import { FORMAT_EXAMPLES } from './examples'

export const metadata: Metadata = { title: 'Formats of an answer' }

const WIDTHS = { configuration: 'configuration (n)', seed: 'seed (n)', position: 'position (3)', quaternion: 'quaternion (4)', twist: 'twist (6)' } as const

/** What a record of a request holds, a row for each choice. */
const REQUEST_ROWS = Object.values(KINEMATIC_OPERATIONS).flatMap(({ path, records }) =>
  Object.entries((records satisfies RecordForm).records).map(([name, parts], i, all) => [
    <code key="path">{path.replace(/.*\//, '/')}</code>,
    all.length === 1 ? 'none' : <code key="name">{i === 0 ? `${name} (or left out)` : name}</code>,
    (parts as RecordForm['records'][string]).map((part) => WIDTHS[part]).join(', '),
  ]),
)

const bitsOf = (words: readonly string[]) => words.map((word, place) => `${word} ${2 ** place}`).join(', ')

export default async function FormatsPage() {
  await connection()
  const revision = `${siteUrl()}/api/v1/teams/tarnholm/models/skerry-7/revisions/1`
  return (
    <DocsPage
      href="/docs/formats"
      title="Formats of an answer"
      lead="The kinematics questions are answered in JSON, as CSV for a spreadsheet, or as binary records for a planner. The numbers are the same to the last bit."
    >
      <p>
        <code>Accept</code> chooses, with its weights: <code>application/json</code> (where nothing is said), <code>text/csv</code> or{' '}
        <code>application/octet-stream</code>. A question comes as JSON or as binary records, which is what its <code>Content-Type</code> says. All six
        ways combine. A problem is always <code>application/problem+json</code>.
      </p>
      <FactTable
        caption="Limits"
        heads={['What', 'At most']}
        rows={[
          ['Question in JSON', '8 MiB, 10 000 configurations or targets'],
          ['Question in binary records', '64 MiB, 100 000 records; 8 kB in the query field "question"'],
          ['Answer', '64 MiB, estimated for its own format before anything is computed'],
        ]}
      />

      <h2 id="fields">What CSV and binary have no room for</h2>
      <p>The reply carries it in fields (RFC 9651):</p>
      <FactTable
        caption="Fields"
        heads={['Field', 'Example']}
        rows={[
          ['Model-Fingerprint', 'the fingerprint, 64 digits; also with JSON'],
          ['Model-Revision', <code key="e">2;team=&quot;tarnholm&quot;;model=&quot;skerry-7&quot;;status=released;warnings=1</code>],
          ['Record-Chain', <code key="e">base=&quot;base_link&quot;, tip=&quot;tool_flange&quot;, joints=7</code>],
          ['Record-Units', <code key="e">length=mm, angle=deg</code>],
          ['Record-Layout', 'the columns of a binary record'],
        ]}
      />
      <p>
        <code>warnings</code> is the number of findings that touch the chain, and left out where there is none. The names and types of the joints are those of
        the chain in the revision; what the warnings say, and <code>characteristicLength</code>, which the question gave, stand in the JSON answer alone. A link
        whose name goes beyond ASCII is written as a Display String.
      </p>

      <h2 id="csv">CSV</h2>
      <p>
        RFC 4180: lines end in CR LF, the first names the columns, each further one is a configuration or target, in order. A column is named by the path of
        its value in a result of the JSON answer: <code>pose.position.0</code>, <code>diagnosis.0.code</code>. Columns stand in the order of the fields in the
        reference, lists from their first entry on.
      </p>
      <p>
        Results may differ in shape: at a singular pose there are more basis columns and lost directions, and a diagnosis has as many entries as there is to
        say. The columns are then all that some result has, and a cell is empty where its result has nothing there. It is empty for <code>null</code>, too: the
        condition number at a singular pose. A field or list that is empty in every result has one column by its own name. So read columns by their names,
        not by their places.
      </p>
      <p>
        Numbers are written as in JSON. A text that a spreadsheet would take for a formula, because it begins with <code>= + - @</code>, is preceded by an
        apostrophe.
      </p>
      <CodeBlock title="Request for CSV" code={FORMAT_EXAMPLES.csv(revision)} />

      <h2 id="binary-in">Binary records in a question</h2>
      <p>
        Binary64 numbers (IEEE 754), little-endian, without anything between them. What a record holds depends on the operation and on <code>record</code> in
        the question; <em>n</em> is the number of independent joints of the chain. The other fields of the question stand beside the records as JSON in
        the query field <code>question</code>.
      </p>
      <FactTable caption="Records of a question" heads={['Operation', '"record"', 'A record holds']} rows={REQUEST_ROWS} />
      <p>
        Beside records with a pose, <code>gains</code> are those of every reference. With <code>target</code>, <code>seeds</code> may give one seed for all. A body
        that is no whole number of records is refused with <code>400</code> and says how many bytes a record has. NaN and infinity are refused. Faults are
        pointed at where they would stand in the JSON question. A whole address and its fields may have 16 kB on their way: encode no more of the question than
        has to be.
      </p>

      <h2 id="binary-out">Binary records in an answer</h2>
      <p>
        Little-endian binary64 numbers again. <code>Record-Layout</code> lists the columns in order; <code>length</code> numbers, or <code>rows</code> times{' '}
        <code>columns</code> of them row by row, belong to one, and as many of those as <code>planes</code> says. A path with <code>*</code> stands for every
        entry of a list, one after the other: <code>links.*.pose.position;rows=2;columns=3</code>. The layout follows from the question and the chain alone, never from the results, so
        that a program may be written for it: a list of changing length has room for the longest it can be, filled up with NaN. NaN also stands
        for <code>null</code>. Truth is 1 and 0.
      </p>
      <FactTable
        caption="Words as numbers"
        heads={['Column', 'What the number means']}
        rows={[
          ['diagnosis', <>the sum of what applies, as <code key="b">bits</code> lists it: {bitsOf(DIAGNOSIS_CODES)}</>],
          ['saturated', 'one number for each joint: 1 where it is saturated'],
          ['violations', 'one number for each joint: −1 below its lower limit, 1 above its upper, else 0'],
          ['reason', <>the place in <code key="c">code</code>, from 1: {INVERSE_KINEMATICS_REASONS.map((word, i) => `${word} ${i + 1}`).join(', ')}; 0 where it converged</>],
          ['links', <>the poses alone, in the order of <code key="l">links</code> in the question</>],
          ['basis', 'n rows and n columns, of which as many hold numbers as nullity says'],
        ]}
      />
      <p>
        The sentences of a diagnosis, its directions and its joints are left out: ask for the same configuration in JSON to read them. New codes will be further
        bits, after those that there are.
      </p>
      <CodeBlock title="Request with binary records" code={FORMAT_EXAMPLES.binary(revision)} />
      <CodeBlock title="Python, nothing but its standard library" code={FORMAT_EXAMPLES.python(revision)} />
    </DocsPage>
  )
}
