import type { Metadata } from 'next'
import { DocsPage } from '@/components/docs/docs-page'
import { Formula } from '@/components/docs/formula'
import { MethodNoteList } from '@/components/docs/method-note-list'
import { SourceList } from '@/components/docs/source-list'

export const metadata: Metadata = { title: 'Methods and sources' }

export default function MethodsPage() {
  return (
    <DocsPage
      href="/docs/methods"
      title="Methods and sources"
      lead="How the numbers are computed, in words and formulas, with the publications that the methods come from."
    >
      <p>
        Symbols: <code>q</code> joint values, <code>q̇</code> joint rates, <code>v</code> the asked twist, <code>J</code> the task Jacobian,{' '}
        <code>σ₁ … σₘ</code> its singular values in falling order with left and right singular vectors <code>u</code> and <code>w</code>, <code>n</code> the
        number of independent joints.
      </p>

      <h2 id="forward-kinematics">Forward kinematics</h2>
      <p>
        The transforms of the joints are multiplied from base to tip. Each joint first places its frame in the parent link, then moves about, or along, its
        axis brought to length 1:
      </p>
      <Formula>{`T(q) = Trans(xyz) · Rz(yaw) · Ry(pitch) · Rx(roll) · M(q)

M(q) = I + sin q [a]× + (1 − cos q) [a]×²    revolute, continuous
M(q) = Trans(q · a)                          prismatic`}</Formula>
      <p>
        A joint that mimics another moves by its multiplier times the value of the other plus its offset. Fixed joints are multiplied out once. The rotation
        about an axis is the formula of Rodrigues (Siciliano, Sciavicco, Villani and Oriolo 2009, section 2.5).
      </p>
      <MethodNoteList of="forward-kinematics" />

      <h2 id="jacobian">Geometric Jacobian</h2>
      <p>
        Column <em>i</em> is the twist that a unit rate of joint <em>i</em> gives to the tool point <code>p</code>, with the joint&rsquo;s axis <code>z</code>{' '}
        through the point <code>o</code>:
      </p>
      <Formula>{`J(i) = [ z × (p − o) ; z ]    revolute, continuous
J(i) = [ z ; 0 ]              prismatic`}</Formula>
      <p>
        In base axes, or turned into the axes of the tool. A mimic joint adds its column, times its multiplier, to that of the joint it follows (Whitney
        1972; Siciliano, Sciavicco, Villani and Oriolo 2009, section 3.1).
      </p>
      <MethodNoteList of="jacobian" />

      <h2 id="measures">Singular values, rank, manipulability, condition number</h2>
      <p>
        From a singular value decomposition of the task Jacobian, its linear rows divided by the characteristic length. The rank counts the singular values
        above the tolerance times the largest. Manipulability is the product of the singular values (Yoshikawa 1985), the condition number the first over
        the last (Salisbury and Craig 1982; the characteristic length after Angeles and López-Cajún 1992).
      </p>
      <Formula>{`w = σ₁ σ₂ … σₘ        κ = σ₁ / σₘ        rank = number of σ > tolerance · σ₁`}</Formula>
      <p>
        The linear and the angular rows are decomposed by themselves, too: <code>translationalSingularValues</code> and{' '}
        <code>rotationalSingularValues</code>, each of one unit and free of the characteristic length. A task without linear, or without angular, components
        has none of them.
      </p>
      <MethodNoteList of="measures" />

      <h2 id="null-space">Null space and its canonical basis</h2>
      <p>Joint rates that the task does not feel are those in the image of the projector (Liégeois 1977; Klein and Huang 1983):</p>
      <Formula>N = I − J⁺J</Formula>
      <p>
        A decomposition leaves the sign of a basis vector, and for several vectors their rotation, to chance. The basis answered here does not: it is taken
        from the columns of <code>N</code> in chain order by Gram-Schmidt; each step takes the first column whose remaining norm is at least 0.499 of the
        largest, and makes its component at that joint positive. The factor is not one half because exactly one half is met at everyday poses, where
        rounding would then decide.
      </p>
      <p>
        Along a path even that basis may turn. <code>alignTo</code> takes a basis, usually the one before: the first result is turned to it, and each further
        result to its predecessor, by the rotation within the null space that brings the columns nearest (orthogonal Procrustes, Schönemann 1966).
      </p>
      <p>
        Directions of the tool that no joint rates produce are answered as lost, by the same rule. A lost direction is <em>structural</em> when the chain can
        produce it at no pose: it is lost at each of 32 seeded configurations.
      </p>
      <MethodNoteList of="null-space" />

      <h2 id="inverse">The inverse of a task</h2>
      <p>
        Rates that give the asked twist with the least effort (Whitney 1969) are <code>q̇ = J⁺v</code>. Near a singular pose they grow without bound, and
        the inverses differ in what they do about it. All decide on the Jacobian in SI, not divided by a characteristic length, so that what is
        reported is what decided.
      </p>
      <Formula>{`truncated         q̇ = Σ (uᵀv / σ) w    over σ > tolerance · σ₁
damped            q̇ = Σ σ / (σ² + λ²) (uᵀv) w
adaptive-damped   λ² = (1 − (σₘ/ε)²) λmax²   where σₘ < ε, else 0
filtered          λ by direction   where σ < ε, else 0`}</Formula>
      <p>
        Damping bounds the rates by <code>|v| / 2λ</code> and pays with accuracy: of the motion along a singular direction, the part{' '}
        <code>λ² / (σ² + λ²)</code> is lost (Nakamura and Hanafusa 1986; Wampler 1986). The adaptive form damps only where the smallest singular value is
        below the threshold <code>ε</code> (Chiaverini, Siciliano and Egeland 1994); it is used unless the request says otherwise, with <code>ε</code> = 0.02
        and <code>λmax</code> = 0.05. What was really achieved is in <code>achievedTwist</code> and <code>residual</code>.
      </p>

      <p>
        The filtered form damps only the directions that vanish and leaves the others exact (Maciejewski and Klein 1988).
      </p>
      <p>
        With <code>jointWeights</code> the least effort is measured as <code>q̇ᵀWq̇</code>: a joint with a large weight moves less. The projector then belongs
        to the weighted inverse and is oblique:
      </p>
      <Formula>{`J_W⁺ = W⁻¹Jᵀ (J W⁻¹ Jᵀ)⁻¹        N = I − J_W⁺ J`}</Formula>
      <MethodNoteList of="inverse" />

      <h2 id="objectives">Spending spare freedom</h2>
      <p>A wish for the joints is projected into the null space, so that the task does not feel it (Liégeois 1977):</p>
      <Formula>{`q̇ = J⁺v + N q̇₀

posture         q̇₀ = gain · (posture − q)
mid-range       q̇₀ = −gain / n · (q − middle) / range²
manipulability  q̇₀ = gain · ∂w/∂q,   ∂w/∂qᵢ = w · tr(∂J/∂qᵢ · J⁺)`}</Formula>
      <p>
        A posture is approached the short way round on continuous joints. The second is the joint-range objective of Siciliano and others 2009, section 3.5; a joint without both limits takes no part. The projector always
        comes from the undamped inverse: one made of a damped inverse would leak into the task.
      </p>
      <MethodNoteList of="objectives" />

      <h2 id="limits">Rate limits</h2>
      <p>
        Clipping one joint changes the direction of the tool. Therefore the whole motion is slowed instead, with two factors for the two terms:
      </p>
      <Formula>q̇ = scale · J⁺v + secondaryScale · N q̇₀</Formula>
      <p>
        Of all pairs between 0 and 1 that keep every known rate limit, the one with the largest <code>scale</code> is taken, and of those the one with the
        largest <code>secondaryScale</code>. Spare freedom is given up before the task slows down, and where it helps at the joint that binds it is kept. A
        rate limit that the file does not give is never used. With <code>report</code> nothing is scaled.
      </p>
      <p>
        With <code>saturate</code> a joint that would be too fast is held at its limit, and the others do its part of the task as long as spare freedom
        allows; only then is the task slowed (saturation in the null space: Flacco, De Luca and Khatib 2015). The order of sacrifice is: the objectives,
        then spare freedom, then speed. With a period <code>dt</code> the position limits count as well, so that a joint can always brake in time with its
        acceleration limit <code>A</code>, period by period, for the distance <code>d</code> that is left:
      </p>
      <Formula>{`r = d / (A dt²)     m = ⌊(√(1 + 8r) − 1) / 2⌋
rate ≤ min( limit, A dt (r + m (m + 1) / 2) / (m + 1) )`}</Formula>
      <p>
        With <code>previousRates</code> no rate changes by more than <code>A dt</code>. Where these exclude each other, position wins, then the slowing down.
        A motion back inside a limit is never refused.
      </p>
      <MethodNoteList of="limits" />

      <h2 id="closed-loop">Closed loop</h2>
      <p>Open loop, small errors add up. A reference pose with gains works them off (Siciliano and others 2009, section 3.7):</p>
      <Formula>{`v = v(reference) + [ Kp (p(reference) − p) ; Ko · ϑ r ]`}</Formula>
      <p>
        <code>ϑ r</code> is the rotation vector from the tool to the reference, the short way round. Called with a period of <code>dt</code>, the loop is
        stable for <code>0 &lt; K · dt &lt; 2</code>; beyond that the diagnosis says <code>gain-too-high</code>.
      </p>
      <MethodNoteList of="closed-loop" />

      <h2 id="inverse-kinematics">Inverse kinematics</h2>
      <p>
        A configuration is looked for by steps of Levenberg and Marquardt whose damping shrinks with the square of the error (Sugihara 2011), joints that meet
        a limit being held there: from the seed or the middle of the ranges, then from points of an even sequence over the ranges (Richtmyer 1951). The same question has the same answer everywhere. What is found is the pose within the tolerances, or the best that was
        met and why no better: <code>unreachable</code>, <code>at-limits</code> or <code>stalled</code>. The reason is a judgement
        from the attempts that were made: more <code>attempts</code> may still find a way. Spare freedom is then spent on the objectives. The
        motion from one configuration to another is not examined.
      </p>
      <Formula>{`q ← q + Σ σ / (σ² + λ²) (uᵀe) w        e = [ p(target) − p ; ϑ r ]        λ² ∝ |e|²`}</Formula>
      <MethodNoteList of="inverse-kinematics" />

      <h2 id="diagnosis">Diagnosis</h2>
      <p>
        At a singular pose every inverse answers zero to a twist along the lost direction: a correct least-squares answer, and an arm that stands still for
        ever. So an answer says when that is the case.
      </p>
      <ul>
        <li>
          <code>direction-lost</code>: more than one millionth of the asked twist lies in directions of which the inverse delivers less than one percent.
          The detail says which, and whether an objective is moving the arm out.
        </li>
        <li>
          <code>near-singular</code>: the smallest singular value is below 0.02, or damping is at work.
        </li>
        <li>
          <code>rate-limited</code>, <code>secondary-starved</code>: scale, or secondaryScale, is below 1.
        </li>
        <li>
          <code>at-limit</code>, <code>outside-limits</code>: a joint within 1e-9 of a limit is driven outward, or one is beyond it.
        </li>
      </ul>
      <MethodNoteList of="diagnosis" />

      <h2 id="sources">Sources</h2>
      <SourceList />
    </DocsPage>
  )
}
