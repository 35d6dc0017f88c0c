import Link from 'next/link'
import { cookies } from 'next/headers'
import { ButtonLink } from '@/components/ui/button-link'
import { TextLink } from '@/components/ui/text-link'
import { teamDestinations, type Destination } from './destinations'
import { Logo } from './logo'
import { NavLink } from './nav-link'
import { PhoneMenu, PhoneMenuItem } from './phone-menu'
import { SignOutButton } from './sign-out-button'
import { ThemeSwitch } from './theme-switch'

export interface HeaderProps {
  /** Who is signed in; null for a visitor. */
  readonly person: { readonly name: string; readonly email?: string } | null
  /** The team whose pages are open, or the one to lead to from a public page. */
  readonly team: { readonly slug: string; readonly name: string } | null
}

const DOCS: Destination = { label: 'Docs', href: '/docs' }

/** The strip at the top of every page. */
export async function Header({ person, team }: HeaderProps) {
  const theme = (await cookies()).get('theme')?.value ?? 'system'
  const destinations = team === null ? [] : teamDestinations(team.slug)
  return (
    <header data-screen-only className="sticky top-0 z-30 border-b border-ink bg-sheet">
      <div className="flex h-12 items-center gap-7 px-4 desk:px-6">
        <Link href="/" className="flex min-h-11 items-center gap-2 text-15 font-bold tracking-tight">
          <Logo />
          Elbowroom
        </Link>
        <nav aria-label="Main" className="hidden gap-1 self-stretch desk:flex">
          {destinations.map((destination) => (
            <NavLink
              key={destination.href}
              href={destination.href}
              exact={destination.exact ?? false}
              className="flex items-center border-y-2 border-t-transparent pl-4 font-medium hover:text-blue"
              currentClassName="border-b-blue"
              otherClassName="border-b-transparent"
            >
              {destination.label}
            </NavLink>
          ))}
        </nav>
        <span className="grow" />
        <div className="hidden items-center gap-6 desk:flex">
          <TextLink href={DOCS.href}>Docs</TextLink>
          {team === null ? null : (
            <Link href={`/teams/${team.slug}`} className="label hover:underline">
              {team.name}
            </Link>
          )}
          {person === null ? (
            <ButtonLink href="/sign-in">Sign in</ButtonLink>
          ) : (
            <span className="flex items-center gap-3">
              <span title={person.email}>{person.name}</span>
              <SignOutButton />
            </span>
          )}
        </div>
        <div className="-mx-3 flex items-center">
          <ThemeSwitch initial={theme} />
          <PhoneMenu>
            <nav aria-label="Main" className="border-t border-hair">
              {[...destinations, DOCS].map((destination) => (
                <PhoneMenuItem key={destination.href}>
                  <Link href={destination.href} className="flex min-h-11 items-center border-b border-hair text-15 font-medium">
                    {destination.label}
                  </Link>
                </PhoneMenuItem>
              ))}
            </nav>
            <div className="mt-3 flex items-center justify-between gap-4">
              {person === null ? (
                <PhoneMenuItem>
                  <ButtonLink href="/sign-in" variant="primary" className="w-full">
                    Sign in
                  </ButtonLink>
                </PhoneMenuItem>
              ) : (
                <>
                  <span>
                    <span className="block font-semibold">{person.name}</span>
                    <span className="label block">{team?.name}</span>
                  </span>
                  <SignOutButton />
                </>
              )}
            </div>
          </PhoneMenu>
        </div>
      </div>
    </header>
  )
}
