import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { LiveBench } from '@/components/front/live-bench'
import { Caution } from '@/components/shell/caution'
import { Main } from '@/components/shell/main'
import { ButtonLink } from '@/components/ui/button-link'
import { findVisitor } from '@/lib/http/visit'
import { isSetUp } from '@/lib/teams/is-set-up'
import { radFromDeg } from '@/lib/units'
import { PublicShell } from './public-shell'
import { sampleArm } from './sample-arm'

export const metadata: Metadata = { title: { absolute: 'Elbowroom: robot models under revision control, kinematics over HTTP' } }

/** Elbow up, well away from every stop, so that the self-motion has room on both sides. deg. */
const START = [-8, -40, 0, 84, 0, 46, 0].map(radFromDeg)

const POINTS = [
  { title: 'The importer explains', text: 'A supplier file is read line by line; whatever is wrong or was assumed is named, with its line and its remedy.' },
  { title: 'A release has two pairs of eyes', text: 'Draft, in review, released, superseded or withdrawn: who decided, when, and on which fingerprint.' },
  { title: 'A number names its model', text: 'Pose, Jacobian, null space and joint rates over HTTP. Each answer carries the revision and fingerprint it came from.' },
] as const

export default async function FrontPage() {
  if (!(await isSetUp())) redirect('/setup')
  const [visitor, chain] = await Promise.all([findVisitor(), sampleArm()])
  return (
    <PublicShell>
      <Main className="max-w-[100rem] desk:mx-auto">
        <div className="grid gap-x-12 gap-y-3 pt-3 pb-5 desk:grid-cols-[1fr_29rem] desk:items-end">
          <div>
            <h1 className="max-w-[34ch] text-24 tracking-tight tablet:text-34">One robot description in force, and every number from exactly that one.</h1>
          </div>
          <div>
            <p className="text-15">
              Elbowroom keeps a team&rsquo;s robot models under revision control, and answers kinematics questions about them to engineers, planners and
              gateways.
            </p>
            <div className="mt-3 flex flex-wrap gap-3">
              {visitor === null ? (
                <ButtonLink href="/sign-in" variant="primary">
                  Sign in
                </ButtonLink>
              ) : (
                <ButtonLink href="/teams" variant="primary">
                  Open your desk
                </ButtonLink>
              )}
              <ButtonLink href="/docs">Make a first call</ButtonLink>
            </div>
          </div>
        </div>
        <LiveBench chain={chain} name="Skerry 7, a sample arm" start={START} />
        <Caution className="mt-2 max-w-[110ch]" />
        <ol className="mt-6 grid gap-x-8 gap-y-4 border-t border-ink pt-3 tablet:grid-cols-3">
          {POINTS.map((point, place) => (
            <li key={point.title} className="grid grid-cols-[1.5rem_1fr]">
              <span aria-hidden className="num text-soft">
                {place + 1}
              </span>
              <div>
                <h2 className="text-15">{point.title}</h2>
                <p className="mt-0.5 max-w-[48ch] text-soft">{point.text}</p>
              </div>
            </li>
          ))}
        </ol>
      </Main>
    </PublicShell>
  )
}
