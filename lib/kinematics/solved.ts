/** How the task Jacobian of a pose was solved. */
export interface Solved {
  /** Orthonormal rows of n, the first `rank` of which span what the task feels. */
  rows: Float64Array
  rank: number
  damping: number
  /** Of full rank and nothing damped: then work.taskValues is not filled. */
  easy: boolean
  /** The norm of what the objectives ask for, before projection. */
  wished: number
}
