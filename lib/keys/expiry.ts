/** An expiry as it is stored; null: never. */
export const dateOf = (expiresAt: string | null | undefined): Date | null => (expiresAt === undefined || expiresAt === null ? null : new Date(expiresAt))
