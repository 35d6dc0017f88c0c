import { ProblemPage } from '@/components/shell/problem-page'
import { ButtonLink } from '@/components/ui/button-link'

interface RolePanelProps {
  readonly team: string
  readonly role: string
  readonly requiredRole: string
}

/** In place of a page that the reader's role does not open: says which role would. */
export function RolePanel({ team, role, requiredRole }: RolePanelProps) {
  return (
    <ProblemPage title="Your role does not allow this" actions={<ButtonLink href={`/teams/${team}`}>To the desk</ButtonLink>}>
      This page needs the role <strong>{requiredRole}</strong> or a higher one; yours is <strong>{role}</strong>. An administrator of the team can change
      it.
    </ProblemPage>
  )
}
