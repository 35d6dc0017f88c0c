import type { ReactNode } from 'react'
import { LiveData } from '@/components/api/live-data'

export default function TeamsLayout({ children }: { readonly children: ReactNode }) {
  return <LiveData>{children}</LiveData>
}
