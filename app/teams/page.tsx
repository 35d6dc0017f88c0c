import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { Shell } from '@/components/shell/shell'
import { EmptyState } from '@/components/ui/empty-state'
import { DeskLine } from '@/components/desk/desk-line'
import { getVisitor } from '@/lib/http/visit'
import { listTeams } from '@/lib/teams/list-teams'

export const metadata: Metadata = { title: 'Teams' }

export default async function TeamsPage() {
  const visitor = await getVisitor()
  const teams = await listTeams(visitor.userId)
  const [only] = teams
  if (only !== undefined && teams.length === 1) redirect(`/teams/${only.slug}`)
  return (
    <Shell person={visitor} team={null}>
      <Main narrow>
        <PageHead title="Choose a team" />
        {only === undefined ? (
          <EmptyState title="You belong to no team">An administrator of a team adds you. Then its desk opens here.</EmptyState>
        ) : (
          <ul className="border-t border-ink">
            {teams.map((team) => (
              <DeskLine key={team.slug} href={`/teams/${team.slug}`} title={team.name}>
                You are {team.role} here.
              </DeskLine>
            ))}
          </ul>
        )}
      </Main>
    </Shell>
  )
}
