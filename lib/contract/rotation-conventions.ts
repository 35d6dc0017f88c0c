/** How a measured orientation may be written. Never guessed: a set of reference poses names one of these.
 *  columns: the names of its columns, in order. turns: the axes that angles turn about, each in the frame that the turns before it have
 *  reached (intrinsic), so that R is their product in this order; left out where the numbers are no such angles. */
export const ROTATION_CONVENTIONS = {
  'quaternion-xyzw': { columns: ['qx', 'qy', 'qz', 'qw'], label: 'Quaternion x, y, z, w', meaning: 'Unit quaternion, scalar last.' },
  'quaternion-wxyz': { columns: ['qw', 'qx', 'qy', 'qz'], label: 'Quaternion w, x, y, z', meaning: 'Unit quaternion, scalar first.' },
  'rotation-vector': { columns: ['rx', 'ry', 'rz'], label: 'Rotation vector', meaning: 'Axis times angle, in the axes of the base.' },
  'fixed-xyz': {
    columns: ['roll', 'pitch', 'yaw'],
    label: 'Roll, pitch, yaw about fixed x, y, z',
    meaning: 'R = Rz(yaw) · Ry(pitch) · Rx(roll), as rpy in URDF. The same rotation as intrinsic z-y-x with the three angles in reverse order.',
  },
  'intrinsic-zyx': {
    columns: ['rz', 'ry', 'rx'],
    turns: ['z', 'y', 'x'],
    label: "Intrinsic z-y'-x''",
    meaning: 'R = Rz(rz) · Ry(ry) · Rx(rx): about z, then the new y, then the new x. The same rotation as fixed x-y-z with rx, ry, rz as roll, pitch, yaw.',
  },
  'intrinsic-xyz': {
    columns: ['rx', 'ry', 'rz'],
    turns: ['x', 'y', 'z'],
    label: "Intrinsic x-y'-z''",
    meaning: 'R = Rx(rx) · Ry(ry) · Rz(rz): about x, then the new y, then the new z. The same rotation as turns about fixed z, y, x by rz, ry, rx.',
  },
  'intrinsic-zyz': {
    columns: ['rz1', 'ry', 'rz2'],
    turns: ['z', 'y', 'z'],
    label: "Intrinsic z-y'-z''",
    meaning: 'R = Rz(rz1) · Ry(ry) · Rz(rz2): about z, the new y and the new z.',
  },
} as const satisfies Record<string, { columns: readonly string[]; turns?: readonly ('x' | 'y' | 'z')[]; label: string; meaning: string }>

export type RotationConvention = keyof typeof ROTATION_CONVENTIONS

/** The names, for a schema. */
export const ROTATION_CONVENTION_NAMES = Object.keys(ROTATION_CONVENTIONS) as [RotationConvention, ...RotationConvention[]]

/** The columns of a measured position. */
export const POSITION_COLUMNS = ['x', 'y', 'z'] as const
