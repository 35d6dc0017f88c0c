import type { Metadata } from 'next'
import { DocsPage } from '@/components/docs/docs-page'
import { FactTable } from '@/components/docs/fact-table'
import { Formula } from '@/components/docs/formula'
import { FramesSketch } from '@/components/docs/frames-sketch'
import { TextLink } from '@/components/ui/text-link'

export const metadata: Metadata = { title: 'Conventions' }

export default function ConventionsPage() {
  return (
    <DocsPage href="/docs/conventions" title="Conventions" lead="What every number means, so that two programs that never met agree on it.">
      <FramesSketch />

      <h2>Frames</h2>
      <p>All frames are right-handed. A chain runs from a base link to a tip link of the description.</p>
      <FactTable
        caption="Frames"
        heads={['Frame', 'What it is']}
        rows={[
          ['base', 'The frame of the base link. Poses are always given in it. Its z axis is wherever the supplier put it; on a floor-mounted arm it is usually up.'],
          ['tip', 'The frame of the tip link, such as the flange.'],
          ['tool', <>The tip frame moved by <code key="t">tool</code>, a pose that the request may give. Without one, tool and tip are the same.</>],
        ]}
      />
      <p>
        Where a request says <code>{'"frame": "tip"'}</code>, the axes are those of the tool frame: the tip&rsquo;s, with <code>tool</code> applied.
      </p>

      <h2>Twist</h2>
      <p>
        A twist is six numbers: linear velocity first, then angular velocity. The linear velocity is that of the <em>tool point</em>, not of a point of
        the base that happens to be at the origin. The angular velocity is the same for every point.
      </p>
      <Formula>twist = [vx, vy, vz, wx, wy, wz]</Formula>
      <p>To carry a twist from a point A to a point B of the same body, in the same axes:</p>
      <Formula>{'v(B) = v(A) + ω × (B − A)      ω(B) = ω(A)'}</Formula>
      <p>
        Rows of a Jacobian are in this order, columns in the order of <code>chain.joints</code>. A <em>spatial</em> Jacobian, whose reference point is the
        origin of the base, is another matrix and is not offered: its linear rows are not the speed of the tool.
      </p>

      <h2>Chain and joint order</h2>
      <p>
        URDF gives joints no order, so the chain does: <code>chain.joints</code> lists the joints that move the tip relative to the base, from base to
        tip. Fixed joints are not in it. A joint that mimics another is folded into the one it follows, which stands at the place of the first joint it
        moves; its limits are narrowed by those of its followers. Without <code>chain</code> in the request, the default chain is used: from the root to
        the leaf with most independent joints.
      </p>

      <h2>Units</h2>
      <p>
        Everything is computed in metres and radians. <code>units</code> converts the request and the answer, and is echoed. A URDF file is always in SI.
      </p>
      <FactTable
        caption="Units"
        heads={['Quantity', 'Unit']}
        rows={[
          ['Joint values, limits, positions, twists, rates, errors, the Jacobian', <>as chosen in <code key="u">units</code>: m or mm, rad or deg</>],
          ['Basis of the null space, projector, lost directions', 'always SI'],
          ['Translational and rotational singular values', 'always SI: m/s and rad/s for a unit of joint rates; no characteristic length'],
          ['Singular values, manipulability, condition number, damping, thresholds', 'always SI; linear rows divided by the characteristic length where one is given'],
          ['Gains', '1/s'],
        ]}
      />
      <p>
        The characteristic length <code>L</code> (1 m unless given) makes metres and radians comparable: singular values, rank, manipulability and
        condition number depend on it, so it is in the answer beside them.
      </p>

      <h2>Orientation</h2>
      <p>
        A quaternion is <code>[x, y, z, w]</code>. Both signs mean the same rotation; in answers the first of w, x, y, z whose magnitude exceeds 1e-9 is
        positive. In requests a norm within 0.001 of 1 is normalised, anything else is refused. The description&rsquo;s <code>rpy</code> turns about fixed axes,
        roll about x first:
      </p>
      <Formula>R = Rz(yaw) · Ry(pitch) · Rx(roll)</Formula>

      <h2>Matrices and missing values</h2>
      <p>
        Matrices are nested arrays, row by row. A limit that does not exist is <code>null</code>, as is a condition number that is not finite. NaN and
        infinity never appear in JSON. CSV leaves a cell empty for <code>null</code>, and in binary records NaN stands for it: see{' '}
        <TextLink inline href="/docs/formats">
          formats
        </TextLink>
        .
      </p>
    </DocsPage>
  )
}
