'use client'
import dynamic from 'next/dynamic'
import { useEffect, useRef } from 'react'
import 'swagger-ui-react/swagger-ui.css'
import './reference.css'
import { Skeleton } from '@/components/ui/skeleton'
import { mendReference } from './mend-reference'

// The widget needs a browser, and its 1.4 MB belong on this page alone.
const SwaggerUI = dynamic(() => import('swagger-ui-react'), {
  ssr: false,
  loading: () => (
    <div role="status">
      <span className="sr-only">Loading the reference</span>
      {Array.from({ length: 10 }, (_, row) => (
        <Skeleton key={row} className="mb-2 h-10 w-full" />
      ))}
    </div>
  ),
})

/** The generated reference with its "try it". Requests carry the reader's session, or the key that is typed in. */
export function Reference() {
  const root = useRef<HTMLDivElement>(null)
  useEffect(() => (root.current === null ? undefined : mendReference(root.current)), [])
  return (
    <div ref={root} className="reference">
      <SwaggerUI
        url="/api/v1/openapi.json"
        deepLinking
        defaultModelsExpandDepth={-1}
        docExpansion="list"
        tryItOutEnabled={false}
        displayRequestDuration
        persistAuthorization={false}
      />
    </div>
  )
}
