/** What URDF has inside what, as far as readers of the format agree; by the name of the outer element. A shape inside <geometry> is
 *  looked at apart, because an unknown one changes the looks only. */
export const KNOWN_ELEMENTS: Readonly<Record<string, readonly string[]>> = {
  robot: ['link', 'joint', 'material'],
  link: ['inertial', 'visual', 'collision'],
  inertial: ['origin', 'mass', 'inertia'],
  visual: ['origin', 'geometry', 'material'],
  collision: ['origin', 'geometry'],
  material: ['color', 'texture'],
  joint: ['parent', 'child', 'origin', 'axis', 'limit', 'mimic', 'dynamics', 'calibration', 'safety_controller'],
}

export const KNOWN_SHAPES: readonly string[] = ['box', 'cylinder', 'sphere', 'capsule', 'mesh']

/** The attributes of what enters the computation, of all versions: one that is not listed may be a slip of the pen. */
export const KNOWN_ATTRIBUTES: Readonly<Record<string, readonly string[]>> = {
  joint: ['name', 'type'],
  parent: ['link'],
  child: ['link'],
  origin: ['xyz', 'rpy', 'quat_xyzw'],
  axis: ['xyz'],
  limit: ['lower', 'upper', 'effort', 'velocity', 'acceleration', 'deceleration', 'jerk'],
  mimic: ['joint', 'multiplier', 'offset'],
}
