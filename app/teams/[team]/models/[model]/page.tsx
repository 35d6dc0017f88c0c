import { redirect } from 'next/navigation'
import { revisionHref } from '@/components/import/revision-href'
import { visit } from '@/lib/http/visit'

/** A model's own address leads to the sheet of the revision in force, else of the newest. */
export default async function ModelPage({ params }: { readonly params: Promise<{ team: string; model: string }> }) {
  const { team, model } = await params
  const { at } = await visit('getModel', { team, model })
  const { released, latest } = at.model.model
  redirect(revisionHref(team, model, released ?? latest))
}
