import type { ReactNode } from 'react'
import { Shell } from '@/components/shell/shell'
import { findVisitor } from '@/lib/http/visit'
import { listTeams } from '@/lib/teams/list-teams'

/** The shell of a page that anyone may read; a person who is signed in keeps the way to the team. */
export async function PublicShell({ children }: { readonly children: ReactNode }) {
  const visitor = await findVisitor()
  const [team] = visitor === null ? [] : await listTeams(visitor.userId)
  return (
    <Shell person={visitor === null ? null : { name: visitor.name, email: visitor.email }} team={team === undefined ? null : { slug: team.slug, name: team.name }}>
      {children}
    </Shell>
  )
}
