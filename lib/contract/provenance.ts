import { z } from 'zod'
import { Note, SerialNumber } from './scalars'

export const GEOMETRIES = ['nominal', 'calibrated'] as const

/** Where a description comes from, as whoever imports it says; nothing of it enters the numbers. */
export const provenanceFields = {
  serialNumber: SerialNumber.optional().meta({ description: 'Of the one arm that this describes.' }),
  geometry: z.enum(GEOMETRIES).optional().meta({ description: 'nominal: as drawn; calibrated: as measured on the arm with the serial number.' }),
  supplierNote: Note.optional().meta({ description: 'What the supplier says of the file: version, delivery, validity.' }),
}

export const Provenance = z.strictObject(provenanceFields)
export type Provenance = z.infer<typeof Provenance>
