'use client'
import { signOut } from 'next-auth/react'
import { useState } from 'react'
import { Button } from '@/components/ui/button'

/** Ends the session of this browser and returns to the front page. */
export function SignOutButton({ className }: { readonly className?: string }) {
  const [busy, setBusy] = useState(false)
  const leave = () => {
    setBusy(true)
    signOut({ callbackUrl: '/' }).catch(() => setBusy(false))
  }
  return (
    <Button variant="quiet" busy={busy} onClick={leave} className={className}>
      Sign out
    </Button>
  )
}
