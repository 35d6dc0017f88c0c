/** Turns the frame at `at` about its own z axis by `angle` (rad): T · Rz(angle). */
export function turnAboutZ(frames: Float64Array, at: number, angle: number): void {
  const c = Math.cos(angle)
  const s = Math.sin(angle)
  for (let row = at; row < at + 12; row += 4) {
    const x = frames[row]!, y = frames[row + 1]!
    frames[row] = c * x + s * y
    frames[row + 1] = c * y - s * x
  }
}

/** Slides the frame at `at` along its own z axis by `distance` (m): T · Trans(0, 0, distance). */
export function slideAlongZ(frames: Float64Array, at: number, distance: number): void {
  for (let row = at; row < at + 12; row += 4) frames[row + 3]! += frames[row + 2]! * distance
}
