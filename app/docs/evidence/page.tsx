import type { Metadata } from 'next'
import { CodeBlock } from '@/components/docs/code-block'
import { DocsPage } from '@/components/docs/docs-page'
import { FactTable } from '@/components/docs/fact-table'
import { Caution } from '@/components/shell/caution'
import { TextLink } from '@/components/ui/text-link'
import { CHECK_VECTORS } from '@/lib/contract/check-vectors'
import { EFFECT_SAMPLES, MOST_CHANGES } from '@/lib/contract/comparison'
import { EVIDENCE_OPERATIONS } from '@/lib/contract/evidence-operations'
import { MOST_POSES } from '@/lib/contract/reference-poses'
import { ROTATION_CONVENTION_NAMES, ROTATION_CONVENTIONS } from '@/lib/contract/rotation-conventions'

export const metadata: Metadata = { title: 'Evidence' }

const { table, ...STATED } = EVIDENCE_OPERATIONS.checkReferencePoses.example

export default function EvidencePage() {
  return (
    <DocsPage href="/docs/evidence" title="Evidence" lead="What shows that a description may be released, and that the arm on the floor is the one described.">
      <h2>Two revisions by their effect</h2>
      <p>
        A changed line says little. The comparison says first how far the tip of the later revision stands from that of the earlier one when all joints
        have the same values: the largest, the mean and the 95th percentile (nearest rank) over {EFFECT_SAMPLES} seeded configurations, of the distance
        in the base link and of the angle between the two orientations. The configurations are the same on every machine, so the numbers are, too. The
        worst one can be opened on both sheets. Only then follows what differs in the file.
      </p>
      <FactTable
        caption="What is compared"
        heads={['Case', 'What is done']}
        rows={[
          ['A joint of both revisions', 'It takes values that both allow: the intersection of the two ranges. Without a bound on either side it takes ±π, or ±1 m.'],
          ['A renamed joint or link', 'It is the same one where that is unambiguous: same parent, child, type, origin and axis, another name, and no second candidate beside it.'],
          ['A joint that only one chain has', <>It stands at 0, where a joint that is not there stands as well, and is listed under <code key="h">chain.held</code>. So does one that turns in one revision and slides in the other.</>],
          ['Ranges that do not meet', 'The joint stands in the middle of the gap, and is listed as well.'],
          ['A chain that one revision lacks', <>The comparison is refused with <code key="c">chain-not-found</code>: name two links that both have.</>],
          ['Equal fingerprints', 'No kinematic change: nothing is computed, and every effect is 0.'],
          ['A very long chain', 'Fewer configurations are compared; the answer says how many.'],
        ]}
      />
      <p>More than {MOST_CHANGES} differences are counted and not listed.</p>

      <h2>Check vectors</h2>
      <p>
        A revision that was released has {CHECK_VECTORS} check vectors: seeded configurations within its limits, each with the pose of the tip, the
        Jacobian (base axes, reference point at the tip) and its singular values, in SI. Load the configurations into the real controller, or into a
        program that computes by itself, and compare what it answers. They never change, and stay when the revision is superseded or withdrawn. As CSV
        the columns are named by the path in the JSON, such as <code>pose.position.0</code>.
      </p>
      <CodeBlock
        title="Check vectors as CSV"
        code={`curl -sS "$ELBOWROOM_URL/api/v1/teams/tarnholm/models/skerry-7/revisions/released/check-vectors" \\
  -H "Authorization: Bearer $ELBOWROOM_KEY" -H "Accept: text/csv"`}
      />

      <h2>Reference poses</h2>
      <p>
        A reference pose is a pair: the joint values that the controller shows, and the tool pose that was measured there. Spread the poses over the space that the
        cell will use, bend every joint, and let the arm settle. The model&rsquo;s pose is computed from the joint values and held against the measured one: the distance
        between them and the angle between their orientations are the residuals of the row. A row passes when both are within the tolerance that you
        state; the set passes when every row does. It is stored either way, with who and when, and nobody can change or remove it.
      </p>
      <p>
        The table is CSV, one pose a row, at most {MOST_POSES}: joint values in the order of <code>chain.joints</code>, then <code>x, y, z</code>, then the
        orientation. With a head line of these names the columns may stand in any order; a unit in brackets behind a name is held against the one that
        you state. A spreadsheet that writes decimal commas has to separate the columns by semicolons or tabs. Decimal commas and points in one table
        are refused, and so is everything else that could be read in two ways; each bad cell is named by row and column.
      </p>
      <CodeBlock title="Table" code={table.replaceAll('\r\n', '\n').trimEnd()} />
      <p>With the table goes what nobody should have to guess: none of this has a default.</p>
      <CodeBlock title="Stated with it" code={JSON.stringify(STATED, null, 2)} />
      <p>
        <code>tool</code> is the pose from the tip link to what was measured, such as the centre of a reflector; <code>null</code> says that the tip link itself was. The measured poses
        are those in the base link of the chain: align the measuring device with it first.
      </p>

      <h2>How an orientation is written</h2>
      <FactTable
        caption="Orientations"
        heads={['rotation', 'Columns', 'Meaning']}
        rows={ROTATION_CONVENTION_NAMES.map((name) => {
          const { columns, meaning } = ROTATION_CONVENTIONS[name]
          return [<code key="n">{name}</code>, <code key="c">{columns.join(', ')}</code>, meaning]
        })}
      />
      <p>
        <em>Fixed</em> turns are about the axes of the base, <em>intrinsic</em> ones about the axes that the turns before have reached. A rotation in one is the rotation in the other with
        the order reversed. The norm of a quaternion has to be within 0.001 of 1 and is then normalised.
      </p>

      <h2>A pass before the release</h2>
      <p>
        A team may demand evidence. Then a revision is released only when its newest reference poses pass; until then the service answers{' '}
        <TextLink inline href="/docs/problems/evidence-missing">
          evidence-missing
        </TextLink>
        . The newest count, so that a later measurement that fails is not hidden behind an earlier one that passed.
      </p>
      <Caution className="mt-6" />
    </DocsPage>
  )
}
