'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useForm, useWatch } from 'react-hook-form'
import { toast } from 'sonner'
import { call } from '@/components/api/call'
import { Refusal, sentenceOf } from '@/components/api/refusal'
import { Button } from '@/components/ui/button'
import { TextAreaField } from '@/components/ui/text-area-field'
import type { ReferencePosesResult } from '@/lib/contract/reference-poses'
import { posesHref } from './evidence-href'
import { PosesFields, questionOf } from './poses-fields'
import { PosesOutcome } from './poses-outcome'
import { PosesTable } from './poses-table'
import { StatementFields } from './statement-fields'
import { TableDrop } from './table-drop'

interface PosesFormProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  /** The joints of the default chain, for the hint. */
  readonly joints: readonly string[]
}

interface Failure {
  readonly sentence: string
  readonly details: readonly string[]
}

const EMPTY: PosesFields = { table: '', units: '', rotation: '', measuredAt: '', tool: '', position: '', orientation: '', base: '', tip: '', note: '' }

const failureOf = (error: unknown): Failure => ({
  sentence: sentenceOf(error),
  details: error instanceof Refusal && error.faults.length > 1 ? error.faults.map(({ pointer, detail }) => (pointer === '/table' ? detail : `${pointer} ${detail}`)) : [],
})

/** Takes measured poses with everything that has to be stated with them, shows what comes out, and stores it as evidence. */
export function PosesForm({ path, joints }: PosesFormProps) {
  const router = useRouter()
  const { register, handleSubmit, setValue, control, formState } = useForm({ resolver: zodResolver(PosesFields), defaultValues: EMPTY })
  const [result, setResult] = useState<ReferencePosesResult>()
  const [failure, setFailure] = useState<Failure>()
  const [busy, setBusy] = useState<'check' | 'store'>()
  const [rotation, units, measuredAt] = useWatch({ control, name: ['rotation', 'units', 'measuredAt'] })
  const { errors } = formState

  const send = (act: 'check' | 'store') =>
    handleSubmit(async (fields) => {
      setFailure(undefined)
      setResult(undefined)
      setBusy(act)
      try {
        const body = questionOf(fields)
        if (act === 'check') return setResult((await call('checkReferencePoses', { path, body })).body)
        const { number, passed } = (await call('addReferencePoses', { path, body })).body
        toast(`Reference poses ${number} are stored: ${passed ? 'pass' : 'fail'}.`)
        router.push(posesHref(path, number))
        router.refresh()
      } catch (error) {
        setFailure(failureOf(error))
      } finally {
        setBusy(undefined)
      }
    })()

  return (
    <form
      noValidate
      className="max-w-[60rem] space-y-5"
      onSubmit={(event) => {
        event.preventDefault()
        void send('check')
      }}
    >
      <TableDrop onText={(text) => setValue('table', text, { shouldDirty: true, shouldValidate: formState.isSubmitted })}>
        <TextAreaField
          label="Measured poses, as CSV"
          rows={10}
          spellCheck={false}
          wrap="off"
          hint={`One pose a row: ${joints.length > 0 ? joints.join(', ') : 'the joint values'}, x, y, z, orientation. A first row with these names lets the columns stand in any order. Decimal commas need semicolons or tabs between the columns.`}
          error={errors.table?.message}
          {...register('table')}
        />
      </TableDrop>
      <StatementFields register={register} errors={errors} rotation={rotation} units={units} measuredAt={measuredAt} />
      <div role="alert" className="font-medium text-verm empty:hidden">
        {failure === undefined ? null : (
          <>
            <p>{failure.sentence}</p>
            {failure.details.length === 0 ? null : (
              <ul className="mt-1 max-h-60 list-disc overflow-y-auto pl-5" tabIndex={0} aria-label="What is wrong in the table">
                {failure.details.map((detail) => (
                  <li key={detail}>{detail}</li>
                ))}
              </ul>
            )}
          </>
        )}
      </div>
      <div className="flex flex-wrap gap-3">
        <Button type="submit" busy={busy === 'check'} busyLabel="Checking…">
          Check
        </Button>
        <Button variant="primary" busy={busy === 'store'} busyLabel="Storing…" onClick={() => void send('store')}>
          Store as evidence
        </Button>
        <span className="label self-center">What is stored stays: nobody can change or remove it.</span>
      </div>
      <div aria-live="polite">
        {result === undefined ? null : (
          <section aria-label="Outcome, not stored yet" className="space-y-3">
            <PosesOutcome outcome={result} />
            <PosesTable result={result} />
          </section>
        )}
      </div>
    </form>
  )
}
