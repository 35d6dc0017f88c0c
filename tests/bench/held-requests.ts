/** A batch that is sent while the event loop of the server is watched. */
export interface Held {
  readonly name: string
  /** The last part of the address. */
  readonly path: string
  readonly headers: Readonly<Record<string, string>>
  readonly body: Buffer
}

const CONFIGURATIONS = 10_000
const JOINTS = 7
const configurations = Array.from({ length: CONFIGURATIONS }, (_, i) => [0.1 + i / CONFIGURATIONS, -0.6, i / 20_000, 1.2, 0.3, 0.8 - i / 30_000, 0.1234567890123])
const twists = configurations.map((_, i) => [0.05, 0.01 * Math.sin(i), 0, 0, 0.1, 0])
const QUATERNION = [0, Math.SQRT1_2, 0, Math.SQRT1_2]
const reference = { pose: { position: [0.35, 0.05, 0.6], quaternion: QUATERNION }, twist: [0.05, 0, 0, 0, 0, 0.001234567890123], gains: { position: 1.5, orientation: 1 } }
const targets = configurations.map((_, i) => ({ position: [0.35 + i * 1e-6, 0.05, 0.6], quaternion: QUATERNION }))

interface Question {
  readonly path: string
  readonly name: string
  readonly json: object
  /** The same as binary records: what stands beside them, and their numbers. */
  readonly beside: object
  readonly records: (i: number) => readonly number[]
}

const QUESTIONS: readonly Question[] = [
  { path: 'forward-kinematics', name: 'forward-kinematics', json: { configurations }, beside: {}, records: (i) => configurations[i]! },
  { path: 'jacobian', name: 'jacobian', json: { configurations }, beside: {}, records: (i) => configurations[i]! },
  { path: 'null-space', name: 'null-space', json: { configurations }, beside: {}, records: (i) => configurations[i]! },
  {
    path: 'joint-rates', name: 'joint-rates, twists', json: { configurations, twists, secondary: [{ objective: 'mid-range', gain: 1 }] },
    beside: { secondary: [{ objective: 'mid-range', gain: 1 }] }, records: (i) => [...configurations[i]!, ...twists[i]!],
  },
  {
    path: 'joint-rates', name: 'joint-rates, references', json: { configurations, references: configurations.map(() => reference) }, beside: { record: 'pose-and-twist' },
    records: (i) => [...configurations[i]!, ...reference.pose.position, ...QUATERNION, ...reference.twist],
  },
  {
    path: 'inverse-kinematics', name: 'inverse-kinematics, 500 targets', json: { targets: targets.slice(0, 500), seeds: configurations.slice(0, 500), attempts: 1 },
    beside: { attempts: 1 }, records: (i) => [...targets[i]!.position, ...QUATERNION, ...configurations[i]!],
  },
]

const JSON_TYPE = { 'content-type': 'application/json' }
const ANSWERS = [['JSON', 'application/json'], ['CSV', 'text/csv'], ['binary', 'application/octet-stream']] as const

const asJson = ({ name, path, json }: Question): Held[] =>
  ANSWERS.map(([answer, accept]) => ({ name: `${name}: JSON to ${answer}`, path, headers: { ...JSON_TYPE, accept }, body: Buffer.from(JSON.stringify(json)) }))

function asBinary({ name, path, beside, records, json }: Question): Held {
  const count = 'targets' in json ? 500 : CONFIGURATIONS
  const numbers = Array.from({ length: count }, (_, i) => records(i)).flat()
  return {
    name: `${name}: binary to binary`, path: `${path}?question=${encodeURIComponent(JSON.stringify(beside))}`,
    headers: { 'content-type': 'application/octet-stream', accept: 'application/octet-stream' }, body: Buffer.from(Float64Array.from(numbers).buffer),
  }
}

const SPACES = 8 * 1024 * 1024 - 2048
const large = (name: string, text: string): Held => ({ name, path: 'forward-kinematics', headers: JSON_TYPE, body: Buffer.from(text) })

/** Bodies near the largest: right, wrong and hostile. */
const LARGE: readonly Held[] = [
  large('8 MiB of blanks around one configuration', `{"configurations":${' '.repeat(SPACES)}[[0,0,0,0,0,0,0]]}`),
  large('8 MiB, one configuration of a million numbers', `{"configurations":[[${'0.12345,'.repeat(1_000_000)}0]]}`),
  large('8 MiB, 10 000 configurations of 100 numbers', `{"configurations":[${new Array(CONFIGURATIONS).fill(`[${new Array(100).fill('0.12345').join()}]`).join()}]}`),
  large('8 MiB, a text', `{"chain":{"tip":"${'é'.repeat(4_000_000)}"},"configurations":[[0]]}`),
  large('8 MiB of lists', `{"configurations":[${'[],'.repeat(2_700_000)}[]]}`),
]

/** The largest binary request. */
const MOST_RECORDS: Held = {
  name: `forward-kinematics: 100 000 binary records of ${JOINTS}`, path: 'forward-kinematics',
  headers: { 'content-type': 'application/octet-stream', accept: 'application/octet-stream' },
  body: Buffer.from(Float64Array.from(Array.from({ length: 10 }, () => configurations).flat(2)).buffer),
}

/** What any request costs beside its batch: mostly the embedded database, which computes in the same thread. */
const ONE: Held = large('one configuration', JSON.stringify({ configurations: configurations.slice(0, 1) }))

export const HELD: readonly Held[] = [ONE, ...QUESTIONS.flatMap((question) => [...asJson(question), asBinary(question)]), MOST_RECORDS, ...LARGE]
