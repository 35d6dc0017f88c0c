'use client'
import { signIn } from 'next-auth/react'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { z } from 'zod'
import { Button } from '@/components/ui/button'
import { formResolver } from '@/components/ui/form-resolver'
import { TextField } from '@/components/ui/text-field'

const Credentials = z.object({
  email: z.string().trim().min(1, 'Type the e-mail address of your account.'),
  password: z.string().min(1, 'Type your password.'),
})

/** E-mail and password. leadTo: the page of this site that opens afterwards. */
export function SignInForm({ leadTo }: { readonly leadTo: string }) {
  const [refusal, setRefusal] = useState('')
  // The next page is on its way after the form has done its part.
  const [isLeaving, setLeaving] = useState(false)
  const form = useForm({ resolver: formResolver(Credentials), defaultValues: { email: '', password: '' } })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async (values) => {
    setRefusal('')
    try {
      const outcome = await signIn('credentials', { ...values, redirect: false })
      if (outcome?.ok === true && !outcome.error) {
        setLeaving(true)
        window.location.assign(leadTo)
        return
      }
      setRefusal(
        outcome?.status === 401 || outcome?.error === 'CredentialsSignin'
          ? 'E-mail or password is wrong.'
          : 'The service could not check this just now. Try again in a moment.',
      )
    } catch {
      setRefusal('The service does not answer. Check the connection and try again.')
    }
    form.resetField('password')
    form.setFocus('password')
  })

  return (
    <form onSubmit={submit} noValidate className="grid gap-4">
      <div role="alert" className="border-l-2 border-verm pl-3 font-semibold text-verm empty:hidden">
        {refusal}
      </div>
      <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
      <TextField label="Password" type="password" autoComplete="current-password" error={errors.password?.message} {...form.register('password')} />
      <Button type="submit" variant="primary" busy={isSubmitting || isLeaving} busyLabel="Signing in…">
        Sign in
      </Button>
    </form>
  )
}
