/** The roles of a team, each including those before it. One role a member. */
export const ROLES = ['reader', 'engineer', 'approver', 'administrator'] as const
export type Role = (typeof ROLES)[number]

/** Whether `role` may do what `needed` may do. */
export const includesRole = (role: Role, needed: Role): boolean => ROLES.indexOf(role) >= ROLES.indexOf(needed)
