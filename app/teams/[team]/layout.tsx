import type { ReactNode } from 'react'
import { Shell } from '@/components/shell/shell'
import { visit } from '@/lib/http/visit'

interface TeamLayoutProps {
  readonly params: Promise<{ team: string }>
  readonly children: ReactNode
}

export default async function TeamLayout({ params, children }: TeamLayoutProps) {
  const { team } = await params
  const { caller } = await visit('listModels', { team })
  return (
    <Shell person={caller} team={caller.team}>
      {children}
    </Shell>
  )
}
