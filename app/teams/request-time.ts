/** The moment a page is made, ms since the epoch: what is "soon" on it counts from here, in the browser too. */
export const requestTime = (): number => Date.now()
