import type { ReactNode } from 'react'
import { visit } from '@/lib/http/visit'

interface RevisionLayoutProps {
  readonly params: Promise<{ team: string; model: string; revision: string }>
  readonly children: ReactNode
}

/** Looks the revision up before anything is sent, so that one that is not there answers 404 and not a half-drawn page. */
export default async function RevisionLayout({ params, children }: RevisionLayoutProps) {
  await visit('getRevision', await params)
  return children
}
