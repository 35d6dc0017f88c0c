import { describe, expect, it } from 'vitest'
import { readPoses } from '@/lib/compute/evidence/read-poses'
import { Problem } from '@/lib/errors'
import type { ReferencePosesQuestion } from '@/lib/contract/reference-poses'
import type { Chain } from '@/lib/kinematics/chain'
import { arm } from '@/tests/lib/kinematics/arms'

/** One turning and one sliding joint. */
const plain = arm([{}, { type: 'prismatic' }])
const named = (...names: [string, string]): Chain => ({ ...plain, joints: plain.joints.map((joint, i) => ({ ...joint, name: names[i]! })) })
const chain = named('turn', 'slide')

type Asked = Partial<Omit<ReferencePosesQuestion, 'table'>>
const MM_DEG = { length: 'mm', angle: 'deg' } as const

const read = (table: string, { units = MM_DEG, rotation = 'quaternion-xyzw' }: Asked = {}, of = chain) => readPoses({ table, units, rotation }, of)

/** The faults of a table that is refused. */
async function faultsOf(table: string, asked: Asked = {}, of = chain): Promise<readonly string[]> {
  const error: unknown = await read(table, asked, of).then(
    () => new Error('it was taken'),
    (reason: unknown) => reason,
  )
  if (!(error instanceof Problem)) throw error
  return error.more.errors?.map(({ detail }) => detail) ?? [error.detail]
}

const HEAD = 'turn,slide,x,y,z,qx,qy,qz,qw'
const ROW = '90,250,1,2,3,0,0,0,1'

describe('a table of measured poses', () => {
  it('is read in the units stated', async () => {
    const { poses, decimalMark } = await read(ROW)
    expect(decimalMark).toBe('.')
    expect(poses).toEqual([{ row: 1, configuration: [Math.PI / 2, 0.25], baseFromMeasured: Float64Array.of(1, 0, 0, 0.001, 0, 1, 0, 0.002, 0, 0, 1, 0.003) }])
    const [si] = (await read('1.5,0.25,1,2,3,0,0,0,1', { units: { length: 'm', angle: 'rad' } })).poses
    expect(si).toMatchObject({ configuration: [1.5, 0.25] })
    expect([3, 7, 11].map((i) => si!.baseFromMeasured[i])).toEqual([1, 2, 3])
  })

  it.each([
    ['the usual line ends', `${HEAD}\r\n${ROW}\r\n`],
    ['bare line feeds and blank lines', `${HEAD}\n\n${ROW}\n\n\n`],
    ['a byte order mark', `\ufeff${HEAD}\n${ROW}`],
    ['quotes and blanks around cells', `"turn", "slide",x,y,z,qx,qy,qz,qw\n"90", 250 ,1,2,3,0,0,0,1`],
    ['semicolons', `${HEAD}\n${ROW}`.replaceAll(',', ';')],
    ['tabs', `${HEAD}\n${ROW}`.replaceAll(',', '\t')],
    ['a line that says what separates', `sep=;\n${HEAD.replaceAll(',', ';')}\n${ROW.replaceAll(',', ';')}`],
    ['rows of empty cells below', `${HEAD}\n${ROW}\n,,,,,,,,\n`],
    ['a true minus sign and exponents', `${HEAD}\n9e1,2.5E+2,1,2,3,−0,0,-0,1`],
    ['columns in another order', 'qw,qx,qy,qz,z,y,x,slide,turn\n1,0,0,0,3,2,1,250,90'],
    ['large letters and units behind names', 'turn [deg],slide (mm),X [mm],Y,Z,QX,QY,QZ,QW\n90,250,1,2,3,0,0,0,1'],
  ])('is read with %s', async (_what, table) => {
    const { poses } = await read(table)
    expect(poses.map(({ configuration }) => configuration)).toEqual([[Math.PI / 2, 0.25]])
    expect(Array.from(poses[0]!.baseFromMeasured, (value) => value + 0)).toEqual([1, 0, 0, 0.001, 0, 1, 0, 0.002, 0, 0, 1, 0.003])
  })

  it('is read with decimal commas where something else separates the columns', async () => {
    for (const separator of [';', '\t']) {
      const { poses, decimalMark } = await read(['90,5', '250,25', '1', '2', '3', '0', '0', '0', '1'].join(separator))
      expect(decimalMark).toBe(',')
      expect(poses[0]!.configuration).toEqual([(90.5 * Math.PI) / 180, 0.25025])
    }
    expect((await read('"90,5","250,25",1,2,3,0,0,0,1')).poses[0]!.configuration[1]).toBe(0.25025)
  })

  it('says on which line each pose stands', async () => {
    expect((await read(`${HEAD}\r\n${ROW}\r\n\r\n${ROW}\r\n`)).poses.map(({ row }) => row)).toEqual([2, 4])
  })

  it.each([
    ['quaternion-xyzw', '0.5,0.5,0.5,0.5'],
    ['quaternion-wxyz', '0.5,0.5,0.5,0.5'],
    // A third of a turn about (1, 1, 1): 120° · (1, 1, 1)/√3.
    ['rotation-vector', '69.28203230275509,69.28203230275509,69.28203230275509'],
    ['fixed-xyz', '90,0,90'],
    ['intrinsic-zyx', '90,0,90'],
    ['intrinsic-xyz', '90,90,0'],
    ['intrinsic-zyz', '0,90,90'],
  ] as const)('reads an orientation as %s', async (rotation, numbers) => {
    // METHODS check value FK2: the turn that carries x to y, y to z and z to x.
    const { poses } = await read(`0,0,0,0,0,${numbers}`, { rotation })
    const expected = [0, 0, 1, 0, 1, 0, 0, 0, 0, 1, 0, 0]
    poses[0]!.baseFromMeasured.forEach((entry, i) => expect(Math.abs(entry - expected[i]!), `entry ${i}`).toBeLessThan(1e-15))
  })

  it('keeps the order of columns where a joint has the name of one that is measured', async () => {
    const gantry = named('x', 'y')
    expect((await read('x,y,x,y,z,qx,qy,qz,qw\n90,250,1,2,3,0,0,0,1', {}, gantry)).poses[0]!.configuration).toEqual([Math.PI / 2, 0.25])
    expect(await faultsOf('y,x,x,y,z,qx,qy,qz,qw\n90,250,1,2,3,0,0,0,1', {}, gantry)).toContain('row 1: the column "x" is missing: it has to be column 1')
  })
})

describe('a table that cannot be taken', () => {
  it.each([
    ['no number', `${HEAD}\n90,250,abc,2,3,0,0,0,1`, ['row 2, column 3 (x): "abc" is not a number']],
    ['an empty cell', `${HEAD}\n90,,1,2,3,0,0,0,1`, ['row 2, column 2 (slide): is empty']],
    ['several bad cells', `${HEAD}\n${ROW}\nabc,250,1,2,3,0,0,0,x`, ['row 3, column 1 (turn): "abc" is not a number', 'row 3, column 9 (qw): "x" is not a number']],
    ['a quaternion that is none', `${HEAD}\n90,250,1,2,3,0,0,0,0.9`, ['row 2, column 6 (qx): the norm of the quaternion is 0.9, and must be within 0.001 of 1']],
    ['a number beyond all bounds', `${HEAD}\n90,250,1e13,2,3,0,0,0,1`, ['row 2, column 3 (x): is beyond 1e9']],
    ['infinity', `${HEAD}\n90,250,1e999,2,3,0,0,0,1`, ['row 2, column 3 (x): is beyond 1e9']],
    ['a short row', `${HEAD}\n90,250,1`, ['row 2 has 3 columns; 9 are needed: turn, slide, x, y, z, qx, qy, qz, qw']],
    [
      'decimal commas between commas',
      '90,5,250,0,1,0,2,0,3,0,0,0,0,1',
      ['row 1 has 14 columns; 9 are needed: turn, slide, x, y, z, qx, qy, qz, qw. Where the decimal mark is a comma, separate the columns by semicolons'],
    ],
    [
      'both decimal marks',
      '90,5;250;1.5;2;3;0;0;0;1',
      ['has decimal points, as in row 1, column 3 ("1.5"), and decimal commas, as in row 1, column 1 ("90,5"): use one, and no marks between thousands'],
    ],
    ['marks between thousands', '1.234,5;250;1;2;3;0;0;0;1', ['row 1, column 1 (turn): "1.234,5" is not a number']],
    ['a missing column', `${HEAD.replace(',z', '')}\n90,250,1,2,0,0,0,1`, ['row 1: the column "z" is missing']],
    ['an unknown column', `${HEAD},temperature\n${ROW},21`, ['row 1, column 10: "temperature" is no column of this table']],
    ['a column twice', `${HEAD},x\n${ROW},1`, ['row 1, column 10: "x" is there twice']],
    ['another unit than stated', `${HEAD.replace('x,y', 'x [m],y')}\n${ROW}`, ['row 1, column 3: "x [m]" says m, and mm is stated']],
    ['a unit on a plain number', `${HEAD.replace('qx', 'qx [deg]')}\n${ROW}`, ['row 1, column 6: "qx [deg]" says deg, and no unit is stated']],
    ['nothing but a head line', HEAD, ['holds no pose: send at least one row']],
    ['blanks', ' \n \n', ['holds no pose: send at least one row']],
    ['too many rows', `${ROW}\n`.repeat(1001), ['holds more than 1000 poses: send fewer at once']],
    ['an open quote', `${HEAD}\n"90,250,1`, ['The table does not parse as CSV: row 2: a quote is opened and never closed.']],
    ['a quote within a cell', `${HEAD}\n9"0,250,1,2,3,0,0,0,1`, ['The table does not parse as CSV: row 2: a quote stands in the middle of a cell.']],
  ])('says where: %s', async (_what, table, expected) => expect(await faultsOf(table)).toEqual(expected))

  it('lists fifty faults and no more', async () => expect(await faultsOf('x,250,1,2,3,0,0,0,1\n'.repeat(60).replace(/^x/, '1'))).toHaveLength(50))
})
