'use client'

import '@/components/api/quiet-zod'
import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useEffect } from 'react'
import { useForm } from 'react-hook-form'
import { toast } from 'sonner'
import { z } from 'zod'
import { upload } from '@/components/api/upload'
import { TextAreaField } from '@/components/ui/text-area-field'
import { TextField } from '@/components/ui/text-field'
import type { Finding } from '@/lib/contract/description'
import { NewModelForm as Form } from '@/lib/contract/model'
import { Slug } from '@/lib/contract/scalars'
import { GeometryField, NO_PROVENANCE, ProvenanceFields, sentProvenance } from './provenance-fields'
import { revisionHref } from './revision-href'
import { StoreBar } from './store-bar'
import { useStoring } from './storing'

/** The contract's form; an empty slug is a slug left out. */
const Fields = Form.extend({ slug: z.union([z.literal(''), Slug]), geometry: GeometryField })

interface NewModelFormProps {
  readonly team: string
  readonly file: File
  /** Of an archive: path of the description that was checked. */
  readonly entry: string | undefined
  /** False while the file is not fit to be stored. */
  readonly ready: boolean
  readonly suggestion: string
  readonly onFindings: (findings: readonly Finding[]) => void
}

/** Stores the file as revision 1 of a new model. */
export function NewModelForm({ team, file, entry, ready, suggestion, onFindings }: NewModelFormProps) {
  const router = useRouter()
  const { register, handleSubmit, setError, getFieldState, setValue, formState } = useForm({
    resolver: zodResolver(Fields),
    defaultValues: { name: suggestion, slug: '', note: '', ...NO_PROVENANCE },
  })
  const { errors } = formState
  const storing = useStoring({ setError, names: ['name', 'slug', 'note', 'serialNumber', 'geometry', 'supplierNote'], byCode: { 'slug-taken': 'slug' }, onFindings })

  // Another file brings another suggestion, unless a name was typed.
  useEffect(() => {
    if (!getFieldState('name').isDirty) setValue('name', suggestion)
  }, [suggestion, getFieldState, setValue])

  const submit = handleSubmit((form) =>
    storing.store(async (signal, sent) => {
      const { model, revision } = await upload('createModel', { path: { team }, form: { name: form.name, slug: form.slug || undefined, note: form.note, ...sentProvenance(form), entry }, file, signal }, sent)
      toast(`${model.name} is stored as a draft, revision ${revision.revision}.`)
      router.push(revisionHref(team, model.slug, revision.revision))
    }),
  )

  return (
    <form onSubmit={submit} noValidate className="space-y-4">
      <TextField label="Name" hint="As people call it, such as Skerry 7." error={errors.name?.message} autoComplete="off" {...register('name')} />
      <TextField
        label="Name in addresses"
        hint="Lower-case letters, digits and hyphens; gateways call it, and it stays. Left empty, it is made from the name."
        error={errors.slug?.message}
        autoComplete="off"
        spellCheck={false}
        {...register('slug')}
      />
      <TextAreaField label="Note" hint="Where the file comes from, or what it describes. May be empty." error={errors.note?.message} {...register('note')} />
      <ProvenanceFields register={register} errors={errors} />
      <StoreBar label="Store as a new model" storing={storing} total={file.size} ready={ready} />
    </form>
  )
}
