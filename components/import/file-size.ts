/** The largest URDF that the service reads. */
export const MOST_BYTES = 8 * 1024 * 1024

/** A size as people read it: "3.1 MiB", "12 KiB", "718 bytes". */
export function fileSizeText(bytes: number): string {
  if (bytes >= 1024 * 1024) return `${(bytes / 1024 / 1024).toFixed(1)} MiB`
  return bytes >= 10 * 1024 ? `${Math.round(bytes / 1024)} KiB` : `${bytes} bytes`
}
