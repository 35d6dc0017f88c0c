/** Flags with which Node runs a TypeScript file of this project: tsx resolves the alias of tsconfig.json. */
export const TYPESCRIPT = ['--import', 'tsx']
