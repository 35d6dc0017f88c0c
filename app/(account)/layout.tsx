import type { ReactNode } from 'react'
import { PublicShell } from '@/app/public-shell'

export default function AccountLayout({ children }: { readonly children: ReactNode }) {
  return <PublicShell>{children}</PublicShell>
}
