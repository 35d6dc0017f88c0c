'use client'

import { useState } from 'react'
import { SelectField } from '@/components/ui/select-field'
import { CheckedFindings } from './checked-findings'
import { DropArea } from './drop-area'
import { EntryChooser } from './entry-chooser'
import { findingOfLine } from './findings-by-line'
import { FurtherRevisionForm } from './further-revision-form'
import { ImportSteps } from './import-steps'
import { meshCountText, MeshTable } from './mesh-table'
import { NewModelForm } from './new-model-form'
import type { Place } from './place'
import { SourceView } from './source-view'
import { StructureSummary } from './structure-summary'
import { suggestedName } from './suggested-name'
import { UploadProgress } from './upload-progress'
import { useCheckedFile } from './use-checked-file'

interface ImportDeskProps {
  readonly team: string
  /** Slug of the model that a further revision is meant for; null for a new model. */
  readonly model: string | null
}

/** Import: a file, what the importer has to say about it beside its source, and only then a model or a revision. */
export function ImportDesk({ team, model }: ImportDeskProps) {
  const { checked, check, cancel, replaceFindings } = useCheckedFile(team)
  const [chosen, setChosen] = useState<{ file: File; index: number | null; place: Place } | null>(null)
  const [target, setTarget] = useState<'new' | 'further'>(model === null ? 'new' : 'further')
  const [formFile, setFormFile] = useState<File | null>(null)
  const file = checked?.file ?? null
  // The forms stay once they are there, so that nothing typed is lost when another file is dropped.
  if (checked?.state === 'checked' && checked.structure !== undefined && formFile !== file) setFormFile(file)
  const ready = checked?.state === 'checked' && checked.structure !== undefined
  const current = chosen !== null && chosen.file === file ? chosen : null

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-x-6 gap-y-8 desk:grid-cols-[minmax(0,1fr)_minmax(0,1.15fr)] desk:grid-rows-[auto_1fr]">
      <div className="space-y-8">
        <section aria-label="File" className="space-y-4">
          <DropArea onFile={check} present={file?.name ?? null} />
          {checked?.state === 'sending' ? <UploadProgress label="Checking" sent={checked.sent} total={checked.file.size} onCancel={cancel} /> : null}
          <p role="alert" className="font-medium text-verm empty:hidden">
            {checked?.failure}
          </p>
          {checked?.state === 'checked' && checked.descriptions.length > 1 ? (
            <EntryChooser descriptions={checked.descriptions} chosen={checked.entry} onChoose={(entry) => check(checked.file, entry)} />
          ) : null}
        </section>
        {checked?.state === 'checked' ? (
          <CheckedFindings
            findings={checked.findings}
            isReadable={checked.structure !== undefined}
            chosen={current?.index ?? null}
            onChoose={(index) => {
              const { line, column } = checked.findings[index]!
              setChosen({ file: checked.file, index, place: { line, column } })
            }}
          />
        ) : null}
      </div>
      <div className="desk:col-start-2 desk:row-span-2 desk:row-start-1">
        {checked?.text == null ? (
          <ImportSteps />
        ) : (
          <SourceView
            text={checked.text}
            fileName={checked.entry ?? checked.file.name}
            findings={checked.findings}
            place={current?.place ?? null}
            onLine={(line) => setChosen({ file: checked.file, ...findingOfLine(checked.findings, line) })}
            className="h-[70vh] desk:sticky desk:top-16 desk:h-[calc(100dvh-9.5rem)]"
          />
        )}
      </div>
      <div className="space-y-8">
        {checked?.structure === undefined ? null : (
          <section aria-labelledby="import-structure" className="space-y-3">
            <h2 id="import-structure">What was read</h2>
            <StructureSummary structure={checked.structure} />
          </section>
        )}
        {checked === null || checked.meshes.length === 0 ? null : (
          <section aria-labelledby="import-meshes" className="space-y-2">
            <div className="flex flex-wrap items-baseline justify-between gap-x-4">
              <h2 id="import-meshes">Meshes</h2>
              <span className="label">{meshCountText(checked.meshes)}</span>
            </div>
            <MeshTable meshes={checked.meshes} />
          </section>
        )}
        {formFile === null ? null : (
          <section aria-labelledby="import-store" className="space-y-4 border-t-2 border-ink pt-4">
            <h2 id="import-store">Store it</h2>
            {ready ? null : <p className="text-soft">The file that is here now cannot be stored. What you typed is kept.</p>}
            <SelectField
              label="As"
              value={target}
              onChange={(event) => setTarget(event.target.value === 'further' ? 'further' : 'new')}
              options={[
                { value: 'new', label: 'a new model' },
                { value: 'further', label: 'a further revision of a model' },
              ]}
            />
            <div hidden={target !== 'new'}>
              <NewModelForm
                team={team}
                file={formFile}
                entry={checked?.entry}
                ready={ready}
                suggestion={suggestedName(checked?.structure?.robotName ?? '', formFile.name)}
                onFindings={replaceFindings}
              />
            </div>
            <div hidden={target !== 'further'}>
              <FurtherRevisionForm team={team} file={formFile} entry={checked?.entry} ready={ready} model={model ?? ''} onFindings={replaceFindings} />
            </div>
          </section>
        )}
      </div>
    </div>
  )
}
