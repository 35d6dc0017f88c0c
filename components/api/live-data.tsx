'use client'

import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { NuqsAdapter } from 'nuqs/adapters/next/app'
import { useState } from 'react'
import type { ReactNode } from 'react'
import { Refusal } from './refusal'

/** One cache of live lists for the pages below, and filters kept in the URL. A refusal is an answer and is not asked again. */
export function LiveData({ children }: { readonly children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          queries: { staleTime: 5_000, retry: (count, error) => count < 2 && error instanceof Refusal && error.code === 'unreachable' },
        },
      }),
  )
  return (
    <NuqsAdapter>
      <QueryClientProvider client={client}>{children}</QueryClientProvider>
    </NuqsAdapter>
  )
}
