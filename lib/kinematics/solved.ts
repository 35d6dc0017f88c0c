/** How the task Jacobian of a pose was solved. */
export interface Solved {
  /** The task Jacobian that it was: m x n, row-major. */
  jacobian: Float64Array
  /** Orthonormal rows of n, the first `rank` of which span what the task feels; not filled where there are nullRows. */
  rows: Float64Array
  /** n − rank orthonormal rows of n that span what the task does not feel, or null where only `rows` are at hand. */
  nullRows: Float64Array | null
  rank: number
  damping: number
  /** Of full rank and nothing damped: then work.taskValues is not filled. */
  easy: boolean
  /** The norm of what the objectives ask for, before projection. */
  wished: number
}
