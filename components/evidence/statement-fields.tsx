'use client'

import type { FieldErrors, UseFormRegister } from 'react-hook-form'
import { SelectField } from '@/components/ui/select-field'
import { TextAreaField } from '@/components/ui/text-area-field'
import { TextField } from '@/components/ui/text-field'
import { ROTATION_CONVENTION_NAMES, ROTATION_CONVENTIONS, type RotationConvention } from '@/lib/contract/rotation-conventions'
import { TABLE_UNITS, type PosesFields, type TableUnits } from './poses-fields'

interface StatementFieldsProps {
  readonly register: UseFormRegister<PosesFields>
  readonly errors: FieldErrors<PosesFields>
  readonly rotation: string
  readonly units: string
  readonly measuredAt: string
}

const UNCHOSEN = { value: '', label: 'Choose…' }

const UNIT_LABELS: Record<TableUnits, string> = {
  'mm-deg': 'millimetres and degrees',
  'm-rad': 'metres and radians',
  'm-deg': 'metres and degrees',
  'mm-rad': 'millimetres and radians',
}

const PLACES = [UNCHOSEN, { value: 'tip', label: 'the tip link itself' }, { value: 'tool', label: 'a tool on it' }]

/** What has to be stated with a table, field by field. */
export function StatementFields({ register, errors, rotation, units, measuredAt }: StatementFieldsProps) {
  const convention = rotation in ROTATION_CONVENTIONS ? ROTATION_CONVENTIONS[rotation as RotationConvention] : null
  const pair = units in TABLE_UNITS ? TABLE_UNITS[units as TableUnits] : null
  const unitOf = (kind: 'length' | 'angle') => (pair === null ? '' : `, ${pair[kind]}`)
  return (
    <div className="grid gap-x-6 gap-y-4 tablet:grid-cols-2">
      <SelectField
        label="Units of the table"
        options={[UNCHOSEN, ...Object.entries(UNIT_LABELS).map(([value, label]) => ({ value, label }))]}
        error={errors.units?.message}
        {...register('units')}
      />
      <SelectField
        label="Orientation is written as"
        options={[UNCHOSEN, ...ROTATION_CONVENTION_NAMES.map((value) => ({ value, label: ROTATION_CONVENTIONS[value].label }))]}
        hint={convention === null ? undefined : `${convention.meaning} Columns ${convention.columns.join(', ')}.`}
        error={errors.rotation?.message}
        {...register('rotation')}
      />
      <SelectField label="Measured was" options={PLACES} error={errors.measuredAt?.message} {...register('measuredAt')} />
      {measuredAt === 'tool' ? (
        <TextField
          label={`Tool from the tip link: x y z${unitOf('length')}, qx qy qz qw`}
          placeholder="0 0 120 0 0 0 1"
          autoComplete="off"
          error={errors.tool?.message}
          {...register('tool')}
        />
      ) : (
        <div className="max-tablet:hidden" />
      )}
      <TextField label={`Tolerance of position${unitOf('length')}`} inputMode="decimal" autoComplete="off" error={errors.position?.message} {...register('position')} />
      <TextField label={`Tolerance of orientation${unitOf('angle')}`} inputMode="decimal" autoComplete="off" error={errors.orientation?.message} {...register('orientation')} />
      <TextField label="Base link" placeholder="default" autoComplete="off" spellCheck={false} error={errors.base?.message} {...register('base')} />
      <TextField label="Tip link" placeholder="default" autoComplete="off" spellCheck={false} error={errors.tip?.message} {...register('tip')} />
      <TextAreaField className="tablet:col-span-2" label="Note" hint="How and with what it was measured. May be empty." error={errors.note?.message} {...register('note')} />
    </div>
  )
}
