import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { SetUpForm } from '@/components/account/set-up-form'
import { Main } from '@/components/shell/main'
import { isSetUp } from '@/lib/teams/is-set-up'
import { submitSetUp } from './submit-set-up'

export const metadata: Metadata = { title: 'Set up' }

export default async function SetUpPage() {
  if (await isSetUp()) redirect('/sign-in')
  return (
    <Main narrow>
      <div className="frame mx-auto mt-4 max-w-md p-6 tablet:mt-10">
        <h1>Set up this installation</h1>
        <p className="mt-1 mb-5 text-soft">Nobody can sign in here yet. This makes the first team, with you as its administrator.</p>
        <SetUpForm setUp={submitSetUp} />
      </div>
    </Main>
  )
}
