const joint = (name: string, type: string, parent: string, child: string, place = '0 0 0.1', axis = '0 0 1') =>
  `<joint name="${name}" type="${type}"><parent link="${parent}"/><child link="${child}"/><origin xyz="${place}"/>` +
  `<axis xyz="${axis}"/><limit lower="-2" upper="2" effort="10" velocity="1"/></joint>`

const robot = (name: string, links: readonly string[], joints: readonly string[]) =>
  `<?xml version="1.0"?><robot name="${name}">${links.map((link) => `<link name="${link}"/>`).join('')}${joints.join('')}</robot>`

/** A chain of this many rotary joints, each `length` m above the one before, their axes about z, y, z, … */
export function snake(count: number, length = 0.1): string {
  const links = Array.from({ length: count + 1 }, (_, i) => `l${i}`)
  const axes = ['0 0 1', '0 1 0']
  return robot('snake', links, links.slice(1).map((link, i) => joint(`j${i + 1}`, 'revolute', `l${i}`, link, `0 0 ${length}`, axes[i % 2])))
}

/** A cart whose platform floats, with an arm of one joint on it. */
export const floatingCart = (): string =>
  robot('cart', ['ground', 'platform', 'arm'], [joint('ride', 'floating', 'ground', 'platform'), joint('lift', 'revolute', 'platform', 'arm')])

/** A stand with a left and a right arm of one joint each; the right one is longer. */
export const twoArms = (): string =>
  robot(
    'two_arms',
    ['stand', 'left', 'right', 'right_hand'],
    [joint('left_lift', 'revolute', 'stand', 'left'), joint('right_lift', 'revolute', 'stand', 'right'), joint('right_turn', 'revolute', 'right', 'right_hand')],
  )
