'use client'
import { useParams } from 'next/navigation'
import { Main } from '@/components/shell/main'
import { type FailedPageProps, PageFailure } from '@/components/shell/page-failure'

export default function TeamError(props: FailedPageProps) {
  const { team } = useParams<{ team: string }>()
  return (
    <Main>
      <title>Page not shown · Elbowroom</title>
      <PageFailure {...props} desk={`/teams/${team}`} />
    </Main>
  )
}
