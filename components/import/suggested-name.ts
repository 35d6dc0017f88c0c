/** A name for a model to start from, out of what the file says: "skerry_7" reads as "Skerry 7". */
export function suggestedName(robotName: string, fileName: string): string {
  const raw = robotName.trim() === '' ? fileName.replace(/\.(urdf|xml|zip)$/i, '') : robotName
  const words = raw.replace(/[_\s]+/g, ' ').trim()
  return (words.charAt(0).toLocaleUpperCase('en') + words.slice(1)).slice(0, 120)
}
