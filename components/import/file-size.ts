const MOST_URDF_BYTES = 8 * 1024 * 1024
const MOST_ARCHIVE_BYTES = 64 * 1024 * 1024

export const isArchive = (file: File): boolean => /\.zip$/i.test(file.name)

/** The largest file of its kind that the service reads. */
export const mostBytesOf = (file: File): number => (isArchive(file) ? MOST_ARCHIVE_BYTES : MOST_URDF_BYTES)

/** A size as people read it: "3.1 MiB", "12 KiB", "718 bytes". */
export function fileSizeText(bytes: number): string {
  if (bytes >= 1024 * 1024) return `${(bytes / 1024 / 1024).toFixed(1)} MiB`
  return bytes >= 10 * 1024 ? `${Math.round(bytes / 1024)} KiB` : `${bytes} bytes`
}
