/** A serial arm as a file: joints 1 to `joints` turn about z and y in turn, links of about `length` m. Every pair of arguments gives
 *  other kinematics; the file imports without a finding. */
export function drawnArm(robotName: string, joints: number, length: number): string {
  const links = ['base', ...Array.from({ length: joints }, (_, i) => `link_${i + 1}`), 'tool'].map((name) => `  <link name="${name}"/>`)
  const moving = Array.from(
    { length: joints },
    (_, i) => `  <joint name="joint_${i + 1}" type="revolute">
    <parent link="${i === 0 ? 'base' : `link_${i}`}"/>
    <child link="link_${i + 1}"/>
    <origin xyz="0 0 ${(length * (1 - i / 20)).toFixed(6)}"/>
    <axis xyz="${i % 2 === 0 ? '0 0 1' : '0 1 0'}"/>
    <limit lower="-2.5" upper="2.5" effort="60" velocity="1.5"/>
  </joint>`,
  )
  const tool = `  <joint name="tool_mount" type="fixed">
    <parent link="link_${joints}"/>
    <child link="tool"/>
    <origin xyz="0 0 0.1"/>
  </joint>`
  return `<?xml version="1.0" encoding="UTF-8"?>\n<robot name="${robotName}" version="1.0">\n${[...links, ...moving, tool].join('\n')}\n</robot>\n`
}
