'use client'

import { useState, type FormEvent } from 'react'
import { Button } from '@/components/ui/button'
import { FieldError, controlLook, fieldAttributes } from '@/components/ui/field'
import { useUnits } from '@/components/ui/units-context'
import type { ChainJoint } from '@/lib/kinematics/chain'
import { readConfiguration, textOfConfiguration } from './configuration-text'

interface ConfigurationFieldProps {
  readonly joints: readonly ChainJoint[]
  readonly q: readonly number[]
  readonly isResting: boolean
  readonly onDraw: (q: readonly number[] | null) => void
}

const ID = 'drawn-configuration'

/** The joint values drawn, in one line that can be typed over: "0, -35, 0, 70 deg". */
export function ConfigurationField({ joints, q, isResting, onDraw }: ConfigurationFieldProps) {
  const { units } = useUnits()
  const shown = textOfConfiguration(joints, q, units)
  // What is being typed, until it is drawn or the values change underneath.
  const [draft, setDraft] = useState<{ text: string; over: string } | null>(null)
  const [error, setError] = useState<string>()
  const text = draft !== null && draft.over === shown ? draft.text : shown

  const submit = async (event: FormEvent) => {
    event.preventDefault()
    const read = await readConfiguration(joints, text, units)
    if (typeof read === 'string') return setError(read)
    setError(undefined)
    setDraft(null)
    onDraw(read)
  }
  const hint = joints.some((joint) => joint.type === 'prismatic')
    ? `A bare number counts in ${units.angle} or ${units.length}; a unit may be added, as in 35 deg or 0.2 m.`
    : `A bare number counts in ${units.angle}; a unit may be added, as in 35 deg or 0.6 rad.`

  return (
    <form data-screen-only onSubmit={submit} noValidate className="mt-2 max-w-xl">
      <label htmlFor={ID} className="label block">
        Drawn at
      </label>
      <div className="flex flex-wrap items-start gap-2">
        <input
          {...fieldAttributes(ID, { hint, error })}
          value={text}
          onChange={(event) => setDraft({ text: event.target.value, over: shown })}
          autoComplete="off"
          spellCheck={false}
          inputMode="text"
          className={controlLook(error, 'num min-w-0 flex-1 basis-56')}
        />
        <Button type="submit">Draw</Button>
        {isResting ? null : (
          <Button
            variant="quiet"
            onClick={() => {
              setDraft(null)
              setError(undefined)
              onDraw(null)
            }}
          >
            Reset
          </Button>
        )}
      </div>
      <FieldError id={ID} error={error} />
      <p id={`${ID}-hint`} className="label mt-1">
        {hint}
      </p>
    </form>
  )
}
