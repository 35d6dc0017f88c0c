/** Points of the unit cube that fill it evenly, whatever their number: multiples of the square roots of the first primes, modulo 1.
 *  Richtmyer 1951 (from memory). `index` counts from 1; the same on every machine, because square roots are rounded alike. */
export function lowDiscrepancy(dimensions: number, index: number): number[] {
  return firstPrimes(dimensions).map((prime) => {
    const multiple = 0.5 + index * Math.sqrt(prime)
    return multiple - Math.floor(multiple)
  })
}

function firstPrimes(count: number): number[] {
  const primes: number[] = []
  for (let candidate = 2; primes.length < count; candidate++) {
    if (primes.every((prime) => prime * prime > candidate || candidate % prime !== 0)) primes.push(candidate)
  }
  return primes
}
