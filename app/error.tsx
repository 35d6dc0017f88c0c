'use client'
import { type FailedPageProps, PageFailure } from '@/components/shell/page-failure'

export default function ErrorPage(props: FailedPageProps) {
  return (
    <main id="main" className="px-4 pb-10">
      <title>Page not shown · Elbowroom</title>
      <PageFailure {...props} desk="/teams" />
    </main>
  )
}
