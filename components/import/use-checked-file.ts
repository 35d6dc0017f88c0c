import { useCallback, useRef, useState } from 'react'
import { Refusal, sentenceOf } from '@/components/api/refusal'
import { upload } from '@/components/api/upload'
import type { Finding, Structure } from '@/lib/contract/description'
import type { MeshReference } from '@/lib/contract/mesh'
import { archivedText } from './archived-text'
import { fileSizeText, isArchive, mostBytesOf } from './file-size'
import { sourceText } from './source-text'

export interface CheckedFile {
  readonly file: File
  /** null until it is read, or when it is too large to show. */
  readonly text: string | null
  readonly state: 'sending' | 'checked' | 'failed'
  readonly sent: number
  readonly findings: readonly Finding[]
  /** undefined when an error stands in the way. */
  readonly structure: Structure | undefined
  readonly meshes: readonly MeshReference[]
  /** Of an archive: the description in it that was read or asked for, and all that it has. */
  readonly entry: string | undefined
  readonly descriptions: readonly string[]
  /** Why it was not checked. */
  readonly failure?: string
}

interface Checking {
  readonly checked: CheckedFile | null
  /** entry: path of the description in an archive that has several. */
  readonly check: (file: File, entry?: string) => void
  readonly cancel: () => void
  /** Puts findings in place that came with a refusal to store. */
  readonly replaceFindings: (findings: CheckedFile['findings']) => void
}

const BLANK = { text: null, sent: 0, findings: [], structure: undefined, meshes: [], entry: undefined, descriptions: [] } as const

/** The file that is being looked at: read in the browser for the source view, and checked by the service, which stores nothing. */
export function useCheckedFile(team: string): Checking {
  const [checked, setChecked] = useState<CheckedFile | null>(null)
  const running = useRef<AbortController | null>(null)

  const check = useCallback(
    (file: File, entry?: string) => {
      running.current?.abort()
      const control = new AbortController()
      running.current = control
      const update = (change: Partial<CheckedFile>) => {
        if (!control.signal.aborted) setChecked((known) => (known?.file === file ? { ...known, ...change } : known))
      }
      const most = mostBytesOf(file)
      if (file.size > most) {
        setChecked({ ...BLANK, file, state: 'failed', failure: `The file has ${fileSizeText(file.size)}; at most ${fileSizeText(most)} are read. Nothing was sent.` })
        return
      }
      setChecked({ ...BLANK, file, state: 'sending' })
      const reading = file.arrayBuffer().then((bytes) => new Uint8Array(bytes))
      reading.then(
        (bytes) => (isArchive(file) ? undefined : update({ text: sourceText(bytes) })),
        () => update({ state: 'failed', failure: 'The browser cannot read this file. If it is a folder, choose the .urdf file inside it, or a .zip of it.' }),
      )
      upload('checkImport', { path: { team }, form: { entry }, file, signal: control.signal }, (bytes) => update({ sent: bytes })).then(
        async ({ findings, structure, meshes = [], archive }) => {
          update({ state: 'checked', findings, structure, meshes, entry: archive?.entry ?? entry, descriptions: archive?.descriptions ?? [] })
          if (archive?.entry !== undefined) update({ text: archivedText(await reading, archive.entry) })
          else if (isArchive(file) && archive === undefined) update({ text: sourceText(await reading) })
        },
        (error: unknown) => update({ state: 'failed', failure: sentenceOf(error) }),
      )
    },
    [team],
  )

  const cancel = useCallback(() => {
    running.current?.abort()
    setChecked((known) => (known === null ? null : { ...known, state: 'failed', failure: new Refusal('cancelled', 'Cancelled. Nothing was stored.').message }))
  }, [])

  const replaceFindings = useCallback((findings: CheckedFile['findings']) => {
    setChecked((known) => (known === null ? null : { ...known, state: 'checked', findings, structure: undefined }))
  }, [])

  return { checked, check, cancel, replaceFindings }
}
