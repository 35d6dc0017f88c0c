import type { Role } from '@/lib/access/roles'

export interface DemoTeam {
  readonly slug: string
  readonly name: string
  /** Whether it releases only what was measured. */
  readonly evidenceRequired: boolean
  readonly people: readonly { readonly email: string; readonly name: string; readonly role: Role }[]
  /** File in the data folder that keeps the team's key. */
  readonly keyFile: string
}

/** The two teams of the demo scenario. All invented; `.example` is reserved for such addresses (RFC 2606). */
export const TEAMS: readonly DemoTeam[] = [
  {
    slug: 'tarnholm',
    name: 'Tarnholm Automation',
    evidenceRequired: false,
    people: [
      { email: 'mira@tarnholm.example', name: 'Mira Lund', role: 'administrator' },
      { email: 'tomas@tarnholm.example', name: 'Tomas Aasen', role: 'approver' },
      { email: 'ines@tarnholm.example', name: 'Ines Okafor', role: 'engineer' },
      { email: 'kofi@tarnholm.example', name: 'Kofi Brandvik', role: 'reader' },
    ],
    keyFile: 'demo-key',
  },
  {
    slug: 'kestrel',
    name: 'Kestrel Cellworks',
    evidenceRequired: true,
    people: [
      { email: 'runa@kestrel.example', name: 'Runa Holmvik', role: 'administrator' },
      { email: 'edda@kestrel.example', name: 'Edda Solheim', role: 'approver' },
    ],
    keyFile: 'kestrel-key',
  },
]
