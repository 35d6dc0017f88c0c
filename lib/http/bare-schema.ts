import { z } from 'zod'

interface Bare {
  /** What is inside "optional" and "nullable". */
  readonly schema: z.ZodType
  /** The same, where it is an object. */
  readonly object: z.ZodObject | null
  /** What a list is of, where it is a list. */
  readonly element: z.ZodType | null
}

/** A schema without what says that it may be left out. */
export function bare(schema: z.ZodType): Bare {
  if (schema instanceof z.ZodOptional || schema instanceof z.ZodNullable) return bare(schema.unwrap() as z.ZodType)
  return {
    schema,
    object: schema instanceof z.ZodObject ? schema : null,
    element: schema instanceof z.ZodArray ? (schema.element as z.ZodType) : null,
  }
}
