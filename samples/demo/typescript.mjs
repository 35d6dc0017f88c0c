/** Flags with which Node runs a TypeScript file of this project: tsx resolves the alias of tsconfig.json, and the condition
 *  admits modules that are marked as the server's own. */
export const TYPESCRIPT = ['--conditions=react-server', '--import', 'tsx']
