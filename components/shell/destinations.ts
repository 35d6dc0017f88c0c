export interface Destination {
  readonly label: string
  readonly href: string
  readonly exact?: boolean
}

/** Where the header leads inside a team. */
export const teamDestinations = (team: string): readonly Destination[] => [
  { label: 'Desk', href: `/teams/${team}`, exact: true },
  { label: 'Register', href: `/teams/${team}/models` },
  { label: 'Keys', href: `/teams/${team}/keys` },
]
