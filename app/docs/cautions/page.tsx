import type { Metadata } from 'next'
import { DocsPage } from '@/components/docs/docs-page'

export const metadata: Metadata = { title: 'Cautions' }

export default function CautionsPage() {
  return (
    <DocsPage href="/docs/cautions" title="Cautions" lead="What the numbers of this service are, and what they are not.">
      <h2>An engineering aid, not a safety function</h2>
      <p>
        Poses, Jacobians, null spaces and joint rates are computed from the model as imported. They are aids to engineering. They are not a safety
        function, and this service must not be part of one: it is reached over a network, it makes no promise about when an answer comes, and nothing in
        it has been assessed to a performance level or a safety integrity level.
      </p>
      <h2>The model is not the machine</h2>
      <p>
        A description that imports without a finding can still describe another arm than the one on the floor: another tool, another mounting, a wrong
        joint zero, a limit that the controller does not have. The fingerprint proves that two people use the same description. It does not prove that the
        description is right.
      </p>
      <h2>Check every motion</h2>
      <p>
        Before a computed motion runs at speed, verify it on the machine at reduced speed with the enabling device in hand, with nobody in the hazard zone
        who is not needed there. Do so again after each new revision, tool or mounting.
      </p>
      <h2>Hold when in doubt</h2>
      <p>
        A missing answer, a late answer, an answer with another fingerprint or sequence than expected, and every failure mean <em>hold</em>: rates of zero
        until a person or the cell&rsquo;s own logic has decided otherwise. Program the gateway so that holding needs no answer from here.
      </p>
      <h2>Who decides</h2>
      <p>
        The machine&rsquo;s risk assessment (ISO 12100, ISO 10218-1 and ISO 10218-2), local law and codes, and qualified, licensed people decide what a
        cell may do. Nothing that this service answers takes their place.
      </p>
      <h2>Numbers near a singular pose</h2>
      <p>
        Close to a singular pose small changes of the pose change joint rates greatly. A damped answer is then slower, or points elsewhere, than asked: the
        achieved twist and the residual are part of each answer, and so is a diagnosis in words. Read them; a rate of zero with the diagnosis{' '}
        <code>direction-lost</code> is not a successful motion.
      </p>
    </DocsPage>
  )
}
