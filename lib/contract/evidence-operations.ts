import { z } from 'zod'
import { CheckVector, CheckVectors, CheckVectorsQuery } from './check-vectors'
import { Comparison, ComparisonQuery } from './comparison'
import { operation } from './operation'
import { ReferencePoses, ReferencePosesQuestion, ReferencePosesResult, ReferencePosesSummary } from './reference-poses'
import { listOf, Paging } from './scalars'

const MODEL = '/teams/{team}/models/{model}'
const REVISION = `${MODEL}/revisions/{revision}` as const
const POSES = `${REVISION}/reference-poses` as const

/** Two poses of Skerry 7 as its first revision computes them. */
const MEASURED = {
  table: 'shoulder_pan,shoulder_lift,upper_roll,elbow,fore_roll,wrist,flange_roll,x,y,z,qx,qy,qz,qw\r\n0,0,0,0,0,0,0,0,0,1100,0,0,0,1\r\n90,0,0,0,0,0,0,0,0,1100,0,0,0.70710678,0.70710678\r\n',
  units: { length: 'mm', angle: 'deg' },
  rotation: 'quaternion-xyzw',
  tool: null,
  tolerance: { position: 0.5, orientation: 0.1 },
  note: 'Laser tracker, arm warm, in cell 4.',
} as const

export const EVIDENCE_OPERATIONS = {
  compareRevisions: operation({
    method: 'GET',
    path: `${MODEL}/comparison`,
    tag: 'Evidence',
    summary: 'Compare two revisions by their effect at the tip',
    description:
      'First what happens at the tip for the same joint values, over seeded configurations that both revisions can take; then what differs, element by element. ' +
      'Joints are matched by name, or as renamed where that is unambiguous. A joint that only one chain has, or that turns in one and slides in the other, ' +
      'stands at 0, and is listed under chain.held; a joint whose ranges do not meet stands in the middle of the gap. ' +
      'Both revisions must have the chain. Where the fingerprints agree nothing is computed and every effect is 0.',
    query: ComparisonQuery,
    answer: { status: 200, schema: Comparison },
    errors: ['revision-not-found', 'nothing-released', 'chain-not-found', 'chain-not-computable'],
    conditional: true,
  }),
  getCheckVectors: operation({
    method: 'GET',
    path: `${REVISION}/check-vectors`,
    tag: 'Evidence',
    summary: 'Numbers for the real controller to meet',
    description:
      '24 seeded configurations with pose, Jacobian and singular values, of a revision that was released. SI, base axes. Load the configurations into the ' +
      'controller and compare what it answers.',
    query: CheckVectorsQuery,
    answer: { status: 200, schema: CheckVectors },
    table: { field: 'vectors', entry: CheckVector },
    errors: ['not-released', 'chain-not-found', 'chain-not-computable', 'answer-too-large'],
    conditional: true,
    immutable: true,
  }),
  listReferencePoses: operation({
    method: 'GET',
    path: POSES,
    tag: 'Evidence',
    summary: 'The reference poses of a revision, newest first',
    description: 'Each set with its outcome, without its rows.',
    query: z.strictObject(Paging),
    answer: { status: 200, schema: listOf(ReferencePosesSummary) },
    errors: [],
  }),
  addReferencePoses: operation({
    method: 'POST',
    path: POSES,
    tag: 'Evidence',
    summary: 'Store measured poses as evidence',
    description:
      'Holds each measured pose against the model and stores what comes out with the revision, pass or fail. Nothing stored is changed or removed. ' +
      'A semicolon or tab between the columns is read as well, and with it a decimal comma.',
    body: ReferencePosesQuestion,
    answer: { status: 201, schema: ReferencePoses },
    errors: ['chain-not-found', 'chain-not-computable'],
    example: MEASURED,
  }),
  checkReferencePoses: operation({
    method: 'POST',
    path: `${POSES}/check`,
    tag: 'Evidence',
    summary: 'Hold measured poses against the model without storing them',
    description: 'Answers the same residuals as storing would.',
    body: ReferencePosesQuestion,
    answer: { status: 200, schema: ReferencePosesResult },
    errors: ['chain-not-found', 'chain-not-computable'],
    example: MEASURED,
  }),
  getReferencePoses: operation({
    method: 'GET',
    path: `${POSES}/{set}`,
    tag: 'Evidence',
    summary: 'One set of reference poses, row by row',
    answer: { status: 200, schema: ReferencePoses },
    errors: [],
    conditional: true,
  }),
} as const
