import type { Metadata } from 'next'
import type { ReactNode } from 'react'
import { PublicShell } from '@/app/public-shell'
import { DocsNav } from '@/components/docs/docs-nav'

export const metadata: Metadata = { title: { default: 'Docs', template: '%s · Docs · Elbowroom' } }

export default function DocsLayout({ children }: { readonly children: ReactNode }) {
  return (
    <PublicShell>
      <div className="flex grow flex-col desk:flex-row">
        <DocsNav />
        {children}
      </div>
    </PublicShell>
  )
}
