/** A length of the picture as it is written into it. Sines differ in their last bit between the server's engine and the browser's;
 *  rounded, and without a negative zero, both write the same. */
export function onPaper(value: number, digits = 2): number {
  return Number(value.toFixed(digits)) + 0
}
