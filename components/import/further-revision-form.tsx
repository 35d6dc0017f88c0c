'use client'

import '@/components/api/quiet-zod'
import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { toast } from 'sonner'
import { upload } from '@/components/api/upload'
import { TextAreaField } from '@/components/ui/text-area-field'
import type { Finding } from '@/lib/contract/description'
import { NewRevisionForm } from '@/lib/contract/model'
import { Slug } from '@/lib/contract/scalars'
import { ModelChooser } from './model-chooser'
import { GeometryField, NO_PROVENANCE, ProvenanceFields, sentProvenance } from './provenance-fields'
import { revisionHref } from './revision-href'
import { StoreBar } from './store-bar'
import { useStoring } from './storing'
import { TwinNotice } from './twin-notice'
import { twinOf } from './twin-of'
import type { Twin } from './twin-of'

const Fields = NewRevisionForm.pick({ note: true, serialNumber: true, supplierNote: true }).extend({ model: Slug, geometry: GeometryField })

interface FurtherRevisionFormProps {
  readonly team: string
  readonly file: File
  /** Of an archive: path of the description that was checked. */
  readonly entry: string | undefined
  readonly ready: boolean
  /** Slug of the model that the page was opened for. */
  readonly model: string
  readonly onFindings: (findings: readonly Finding[]) => void
}

/** Stores the file as a further revision of a model. A file that computes the same numbers is stored only when asked for. */
export function FurtherRevisionForm({ team, file, entry, ready, model, onFindings }: FurtherRevisionFormProps) {
  const router = useRouter()
  const { register, handleSubmit, setError, formState } = useForm({ resolver: zodResolver(Fields), defaultValues: { model, note: '', ...NO_PROVENANCE } })
  const { errors } = formState
  const [twin, setTwin] = useState<Twin | null>(null)
  const storing = useStoring({
    setError,
    names: ['model', 'note', 'serialNumber', 'geometry', 'supplierNote'],
    byCode: { 'model-not-found': 'model' },
    onFindings,
    onRefusal: (refusal) => twinOf(refusal, file, '') !== null,
  })

  const submit = (allowSame: boolean) =>
    handleSubmit((form) =>
      storing.store(async (signal, sent) => {
        const ask = { path: { team, model: form.model }, form: { note: form.note, ...sentProvenance(form), allowSame: allowSame ? 'true' : 'false', entry }, file, signal } as const
        try {
          const revision = await upload('createRevision', ask, sent)
          toast(`Revision ${revision.revision} of ${revision.model.name} is stored as a draft.`)
          router.push(revisionHref(team, form.model, revision.revision))
        } catch (error) {
          setTwin(twinOf(error, file, form.model))
          throw error
        }
      }),
    )()

  return (
    <form
      noValidate
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault()
        void submit(false)
      }}
    >
      <ModelChooser team={team} error={errors.model?.message} {...register('model')} />
      <TextAreaField label="What changed" hint="Stands in the revision table of the sheet." error={errors.note?.message} {...register('note')} />
      <ProvenanceFields register={register} errors={errors} />
      {twin !== null && twin.file === file ? (
        <TwinNotice href={revisionHref(team, twin.model, twin.revision)} revision={twin.revision} busy={storing.busy} onStore={() => void submit(true)} />
      ) : null}
      <StoreBar label="Store as a further revision" storing={storing} total={file.size} ready={ready} />
    </form>
  )
}
