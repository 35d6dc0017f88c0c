import type { Provenance } from '@/lib/contract/provenance'
import type { ReferencePosesQuestion } from '@/lib/contract/reference-poses'

/** One change of status of a demo revision. */
export interface DemoTransition {
  readonly by: string
  readonly to: 'in-review' | 'released'
  readonly comment: string
}

/** Measured poses of a demo revision: a table beside the sample files, and how it is to be read. */
export interface DemoEvidence extends Omit<ReferencePosesQuestion, 'table'> {
  readonly by: string
  readonly file: string
}

export interface DemoModel {
  readonly team: string
  readonly slug: string
  readonly name: string
  readonly note: string
  /** Who imports its files. */
  readonly importer: string
  /** Sample files in the order of their revisions, each with what became of it. */
  readonly revisions: readonly { readonly file: string; readonly note?: string; readonly provenance?: Provenance; readonly evidence?: DemoEvidence; readonly history: readonly DemoTransition[] }[]
}

const INES = 'ines@tarnholm.example'
const TOMAS = 'tomas@tarnholm.example'
const RUNA = 'runa@kestrel.example'

const submitted = (comment: string): DemoTransition => ({ by: INES, to: 'in-review', comment })
const released = (comment: string): DemoTransition => ({ by: TOMAS, to: 'released', comment })

/** The arm of cell 4 as it was measured: beyond the tolerance for the nominal description, within it for the calibrated one. */
const MEASURED: DemoEvidence = {
  by: INES,
  file: 'skerry-7-reference-poses.csv',
  units: { length: 'mm', angle: 'deg' },
  rotation: 'fixed-xyz',
  tool: null,
  tolerance: { position: 0.25, orientation: 0.05 },
  note: 'Laser tracker in cell 4, reflector at the flange centre, arm warm.',
}

/** What the two teams have in their registers: something of every status, so that every page has something to show. */
export const CATALOGUE: readonly DemoModel[] = [
  {
    team: 'tarnholm',
    slug: 'skerry-7',
    name: 'Skerry 7',
    note: 'Seven-axis arm of cell 4.',
    importer: INES,
    revisions: [
      {
        file: 'skerry-7.urdf',
        note: 'As delivered, nominal dimensions.',
        provenance: { geometry: 'nominal', supplierNote: 'Drawing set 7, issue C.' },
        evidence: MEASURED,
        history: [submitted('Nominal file from the supplier.'), released('Dimensions agree with the drawing.')],
      },
      {
        file: 'skerry-7-revision-2.urdf',
        note: 'As calibrated on the floor; wrist limit narrowed for the hose dress.',
        provenance: { geometry: 'calibrated', serialNumber: 'SK7-0042' },
        evidence: MEASURED,
        history: [
          submitted('Calibration of the arm in cell 4, and one limit.'),
          released('Compared with revision 1: fractions of a millimetre at the tool, and the wrist limit as agreed.'),
        ],
      },
    ],
  },
  {
    team: 'tarnholm',
    slug: 'trainer-3r',
    name: 'Trainer 3R',
    note: 'Planar arm of the training bench. Its numbers can be checked by hand.',
    importer: INES,
    revisions: [{ file: 'trainer-3r.urdf', history: [submitted('For the training bench.'), released('Checked by hand at three poses.')] }],
  },
  {
    team: 'tarnholm',
    slug: 'gannet-4',
    name: 'Gannet 4',
    note: 'SCARA of the assembly cell.',
    importer: INES,
    revisions: [{ file: 'gannet-4.urdf', history: [submitted('First delivery.'), released('Stroke of the quill measured.')] }],
  },
  {
    team: 'tarnholm',
    slug: 'fulmar-6',
    name: 'Fulmar 6',
    note: 'Six-axis arm for the palletiser.',
    importer: INES,
    revisions: [{ file: 'fulmar-6.urdf', history: [submitted('Please check the wrist limits against the manual.')] }],
  },
  {
    team: 'tarnholm',
    slug: 'skerry-7-rail',
    name: 'Skerry 7 on rail',
    note: 'The seven-axis arm on the 3 m rail of cell 5.',
    importer: INES,
    revisions: [{ file: 'skerry-7-rail.urdf', note: 'Rail travel to be confirmed.', history: [] }],
  },
  {
    team: 'tarnholm',
    slug: 'dunlin-2',
    name: 'Dunlin 2',
    note: 'Two-axis positioner. The file has a slip that the importer points out.',
    importer: INES,
    revisions: [{ file: 'flawed-warning.urdf', history: [] }],
  },
  {
    team: 'kestrel',
    slug: 'fulmar-6',
    name: 'Fulmar 6',
    note: 'The same arm in another house: neither team sees the other.',
    importer: RUNA,
    revisions: [{ file: 'fulmar-6.urdf', history: [] }],
  },
]
