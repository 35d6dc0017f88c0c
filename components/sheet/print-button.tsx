'use client'

import { Button } from '@/components/ui/button'

/** Prints the sheet as a drawing. */
export function PrintButton() {
  return <Button onClick={() => window.print()}>Print</Button>
}
