import type { FieldError, UseFormRegisterReturn } from 'react-hook-form'
import { z } from 'zod'
import { SelectField } from '@/components/ui/select-field'
import { TextAreaField } from '@/components/ui/text-area-field'
import { TextField } from '@/components/ui/text-field'
import { GEOMETRIES, type Provenance } from '@/lib/contract/provenance'

/** A choice that need not be made. */
export const GeometryField = z.enum(['', ...GEOMETRIES])

/** What the fields hold before anybody has filled them in. */
export const NO_PROVENANCE = { serialNumber: '', geometry: '', supplierNote: '' } as const

/** The form's fields as they are sent: a choice that was not made is left out. */
export const sentProvenance = ({ serialNumber, geometry, supplierNote }: Omit<Provenance, 'geometry'> & { readonly geometry: z.infer<typeof GeometryField> }): Provenance => ({
  ...(serialNumber && { serialNumber }),
  ...(geometry && { geometry }),
  ...(supplierNote && { supplierNote }),
})

interface ProvenanceFieldsProps {
  readonly register: (name: keyof Provenance) => UseFormRegisterReturn
  readonly errors: Partial<Record<keyof Provenance, Pick<FieldError, 'message'>>>
}

/** Where the file comes from. May all stay empty. */
export function ProvenanceFields({ register, errors }: ProvenanceFieldsProps) {
  return (
    <>
      <div className="grid gap-4 tablet:grid-cols-2">
        <TextField label="Serial number" hint="Of the one arm that the file describes." error={errors.serialNumber?.message} autoComplete="off" spellCheck={false} {...register('serialNumber')} />
        <SelectField
          label="Geometry"
          hint="As drawn, or as measured on that arm."
          error={errors.geometry?.message}
          options={[
            { value: '', label: 'not stated' },
            ...GEOMETRIES.map((word) => ({ value: word, label: word })),
          ]}
          {...register('geometry')}
        />
      </div>
      <TextAreaField label="Supplier's note" hint="What the supplier says of the file: version, delivery. May be empty." error={errors.supplierNote?.message} {...register('supplierNote')} />
    </>
  )
}
