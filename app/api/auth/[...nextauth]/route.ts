import type { NextRequest } from 'next/server'
import NextAuth from 'next-auth'
import { signInOptions } from '@/lib/access/sign-in'

const handler = (request: NextRequest, context: { params: Promise<{ nextauth: string[] }> }) =>
  NextAuth(request as never, context as never, signInOptions())

export { handler as GET, handler as POST }
