import type { Metadata, Viewport } from 'next'
import { cookies } from 'next/headers'
import { connection } from 'next/server'
import type { ReactNode } from 'react'
import { Toaster } from '@/components/ui/toaster'
import { UnitsProvider } from '@/components/ui/units-context'
import { archivo, archivoExtended, commitMono } from './fonts'
import './globals.css'

export const metadata: Metadata = {
  title: { default: 'Elbowroom', template: '%s · Elbowroom' },
  description: "A team's robot models under revision control, and kinematics answered from exactly the released one.",
}

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#FBFAF7' },
    { media: '(prefers-color-scheme: dark)', color: '#161E27' },
  ],
}

export default async function RootLayout({ children }: { readonly children: ReactNode }) {
  // Every page carries the nonce of its request, so none is made ahead of one.
  await connection()
  const choices = await cookies()
  const theme = choices.get('theme')?.value
  const fonts = `${archivo.variable} ${archivoExtended.variable} ${commitMono.variable}`
  return (
    <html lang="en" className={fonts} data-theme={theme === 'paper' || theme === 'night' ? theme : undefined}>
      <body>
        <UnitsProvider initial={choices.get('units')?.value}>{children}</UnitsProvider>
        <Toaster />
      </body>
    </html>
  )
}
