import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { SignInForm } from '@/components/account/sign-in-form'
import { Main } from '@/components/shell/main'
import { sameOriginPath } from '@/components/ui/same-origin-path'
import { TextLink } from '@/components/ui/text-link'
import { siteOrigins } from '@/lib/env'
import { findVisitor } from '@/lib/http/visit'
import { isSetUp } from '@/lib/teams/is-set-up'

export const metadata: Metadata = { title: 'Sign in' }

interface SignInPageProps {
  readonly searchParams: Promise<{ callbackUrl?: string | string[]; error?: string; setUp?: string }>
}

export default async function SignInPage({ searchParams }: SignInPageProps) {
  if (!(await isSetUp())) redirect('/setup')
  const { callbackUrl, error, setUp } = await searchParams
  const asked = typeof callbackUrl === 'string' ? callbackUrl : null
  const path = siteOrigins().map((origin) => sameOriginPath(asked, origin)).find((found) => found !== null)
  const leadTo = path === undefined || path === null || path.startsWith('/sign-in') ? '/teams' : path
  if ((await findVisitor()) !== null) redirect(leadTo)
  return (
    <Main narrow>
      <div className="frame mx-auto mt-4 max-w-md p-6 tablet:mt-10">
        <h1 className="mb-4">Sign in</h1>
        {setUp === 'done' ? (
          <p role="status" className="mb-4 border-l-2 border-ink pl-3">
            The installation is set up. Sign in with the address and password that you have just chosen.
          </p>
        ) : null}
        {error === undefined ? null : (
          <p role="alert" className="mb-4 border-l-2 border-verm pl-3 font-semibold text-verm">
            Signing in did not succeed. Try again.
          </p>
        )}
        <SignInForm leadTo={leadTo} />
        <p className="mt-5 border-t border-hair pt-3 text-soft">
          No account, or the password is lost? An administrator of your team can help. The{' '}
          <TextLink inline href="/docs">
            docs
          </TextLink>{' '}
          can be read without an account.
        </p>
      </div>
    </Main>
  )
}
