import { describe, expect, it } from 'vitest'
import { AXIS, parse, robot, rulesOf, turning } from './urdf-text'

const limited = (lower: string, upper: string) => rulesOf(parse(turning(`${AXIS}<limit lower="${lower}" upper="${upper}" effort="1" velocity="1"/>`)).findings)
const moments = (mass: string, ...[ixx, ixy, ixz, iyy, iyz, izz]: readonly number[]) =>
  rulesOf(parse(robot(`<link name="a"><inertial><mass value="${mass}"/><inertia ixx="${ixx}" ixy="${ixy}" ixz="${ixz}" iyy="${iyy}" iyz="${iyz}" izz="${izz}"/></inertial></link>`)).findings)

describe('a bound that is a multiple of a quarter turn', () => {
  it.each(['3.1416', '3.142', '1.5708', '1.571', '4.7124', '6.2832', '3.141593', ' 3.1416 '])('is noted when it is rounded up: %s', (upper) => {
    expect(limited('0', upper)).toEqual(['limit-rounded-up'])
  })

  it.each(['3.14', '3.1415', '3.14159', '3.141592653589793', '3.14159265359', '3.1415927', '3.15', '3.2', '2.3', '1.57', '1.58', '6.283', '0.001', '3.1420', '3'])('is not noted at %s', (upper) => {
    expect(limited('0', upper)).toEqual([])
  })

  it('is noted once for a joint that has two', () => {
    expect(limited('-3.1416', '3.1416')).toEqual(['limit-rounded-up'])
  })
})

describe('a range of more than a turn', () => {
  it.each([['-3.15', '3.15'], ['-6.2', '6.2'], ['0', '700'], ['-1e16', '1e16']])('is noted from %s to %s', (lower, upper) => {
    expect(limited(lower, upper)).toEqual(['range-beyond-turn'])
  })

  it.each([['-3.14', '3.14'], ['-3.1415', '3.1415'], ['0', '6.28'], ['-2.9', '2.9']])('is not met from %s to %s', (lower, upper) => {
    expect(limited(lower, upper)).toEqual([])
  })

  it('is not met on a slide', () => {
    expect(parse(turning(`${AXIS}<limit lower="-20" upper="20" effort="1" velocity="1"/>`, '', 'prismatic')).findings).toEqual([])
  })
})

describe('an inertia', () => {
  it.each([
    ['of a solid', ['2', 0.01, 0, 0, 0.01, 0, 0.005]],
    ['of a flat plate, whose moments add up', ['2', 0.01, 0, 0, 0.02, 0, 0.03]],
    ['of a thin rod', ['1', 0.02, 0, 0, 0.02, 0, 0]],
    ['about crooked axes', ['1', 0.02, 0.004, -0.003, 0.025, 0.002, 0.03]],
    ['that was rounded to two digits', ['1', 0.0012, 0, 0, 0.0021, 0, 0.0033]],
    ['of zeros, which stands for no body', ['0', 0, 0, 0, 0, 0, 0]],
    ['of a very small body', ['1e-9', 1e-15, 0, 0, 1e-15, 0, 1e-15]],
  ] as const)('%s is not noted', (_what, [mass, ...values]) => {
    expect(moments(mass, ...values)).toEqual([])
  })

  it.each([
    ['with one moment larger than the two others', ['1', 0.01, 0, 0, 0.01, 0, 0.03]],
    ['with a product that no body has', ['1', 0.01, 0.02, 0, 0.01, 0, 0.01]],
    ['with a negative moment', ['1', 0.01, 0, 0, 0.01, 0, -0.01]],
    ['with products alone', ['1', 0, 0.01, 0, 0, 0, 0]],
    ['of a negative mass', ['-1', 0.01, 0, 0, 0.01, 0, 0.01]],
    ['of a mass beyond reading', ['1e99', 0.01, 0, 0, 0.01, 0, 0.01]],
  ] as const)('%s is noted', (_what, [mass, ...values]) => {
    expect(moments(mass, ...values)).toEqual(['inertia-implausible'])
  })
})

describe('an element that is not used', () => {
  it('is noted once for its name and place, with how often it is met', () => {
    const { findings } = parse(robot('<gazebo/><link name="a"><gazebo/><gazebo/></link>\n<gazebo/><gazebo/>'))
    expect(findings.map(({ message, element }) => [message, element])).toEqual([
      ['<gazebo> stands 3 times directly inside <robot>: it is kept in the file and not used.', undefined],
      ['<gazebo> stands 2 times inside <link>: it is kept in the file and not used.', "link 'a'"],
    ])
  })

  it('is not looked into', () => {
    expect(rulesOf(parse(robot('<link name="a"/><drives><link/><joint/><loop_joint/><mesh/></drives>')).findings)).toEqual(['unknown-element'])
  })
})

describe('unusual names', () => {
  it('are noted together, in the order of the file, each once', () => {
    const { findings } = parse(robot('<link name="b c"/><link name="é"/><joint name="b c" type="fixed"><parent link="b c"/><child link="é"/></joint>'))
    expect(findings.map(({ message }) => message)).toEqual(["The names 'b c' and 'é' have other characters than letters A to Z, digits, '_' and '-'."])
  })
})
