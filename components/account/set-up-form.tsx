'use client'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { formResolver } from '@/components/ui/form-resolver'
import { TextField } from '@/components/ui/text-field'
import { SetupForm } from '@/lib/contract/set-up'

type Outcome = { readonly ok: true; readonly team: string } | { readonly ok: false; readonly field: keyof SetupForm | null; readonly detail: string }

/** The first administrator and team of an empty installation. setUp: does it on the server. */
export function SetUpForm({ setUp }: { readonly setUp: (input: SetupForm) => Promise<Outcome> }) {
  const router = useRouter()
  const [refusal, setRefusal] = useState('')
  const form = useForm<SetupForm>({
    resolver: formResolver(SetupForm),
    defaultValues: { code: '', teamName: '', name: '', email: '', password: '' },
    mode: 'onTouched',
  })
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState

  const submit = form.handleSubmit(async (values) => {
    setRefusal('')
    const outcome = await setUp(values).catch(() => null)
    if (outcome === null) {
      setRefusal('The service did not answer; nothing is known to be stored. Try again.')
      return
    }
    if (outcome.ok) {
      router.replace('/sign-in?setUp=done')
      return
    }
    if (outcome.field === null) setRefusal(outcome.detail)
    else form.setError(outcome.field, { message: outcome.detail }, { shouldFocus: true })
  })
  const isDone = isSubmitSuccessful && refusal === '' && Object.keys(errors).length === 0

  return (
    <form onSubmit={submit} noValidate className="grid gap-4">
      <div role="alert" className="border-l-2 border-verm pl-3 font-semibold text-verm empty:hidden">
        {refusal}
      </div>
      <TextField
        label="Setup code"
        hint={
          <>
            Printed in the log of the running service, in the line <code>setup code</code>. It is good for one use.
          </>
        }
        autoComplete="off"
        spellCheck={false}
        error={errors.code?.message}
        {...form.register('code')}
      />
      <TextField label="Team" hint="Who owns the models, such as a department or a company." autoComplete="organization" error={errors.teamName?.message} {...form.register('teamName')} />
      <TextField label="Your name" hint="As it stands in title blocks." autoComplete="name" error={errors.name?.message} {...form.register('name')} />
      <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
      <TextField
        label="Password"
        hint="At least 12 characters. Several words are easier to keep than a few signs."
        type="password"
        autoComplete="new-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" variant="primary" busy={isSubmitting || isDone} busyLabel="Setting up…">
        Set up
      </Button>
    </form>
  )
}
