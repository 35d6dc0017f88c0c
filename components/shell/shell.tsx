import type { ReactNode } from 'react'
import { Footer } from './footer'
import { Header, type HeaderProps } from './header'

/** Header and footer around a page. The page brings its own `<Main>`. */
export function Shell({ person, team, children }: HeaderProps & { readonly children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <a href="#main" className="sr-only z-50 bg-sheet px-4 py-2 font-semibold text-blue focus:not-sr-only focus:fixed focus:top-1 focus:left-1">
        Skip to the content
      </a>
      <Header person={person} team={team} />
      {children}
      <Footer />
    </div>
  )
}
