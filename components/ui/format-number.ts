/** A number with fixed digits after the point, a true minus sign and no negative zero; a dash when there is none. */
export function formatNumber(value: number | null | undefined, digits: number): string {
  if (value === null || value === undefined || Number.isNaN(value)) return '–'
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞'
  const text = Math.abs(value).toFixed(digits)
  return value < 0 && Number(text) !== 0 ? `−${text}` : text
}

/** A number with significant digits, for quantities that run over decades. */
export function formatSignificant(value: number | null | undefined, digits: number): string {
  if (value === null || value === undefined || Number.isNaN(value)) return '–'
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞'
  return value.toPrecision(digits).replace('e-', 'e−').replace(/^-/, '−')
}
