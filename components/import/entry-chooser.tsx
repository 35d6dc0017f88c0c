import { SelectField } from '@/components/ui/select-field'

interface EntryChooserProps {
  readonly descriptions: readonly string[]
  readonly chosen: string | undefined
  readonly onChoose: (path: string) => void
}

/** Which description of an archive with several is meant: none is guessed at. */
export function EntryChooser({ descriptions, chosen, onChoose }: EntryChooserProps) {
  return (
    <SelectField
      label={`Description, one of ${descriptions.length} in the archive`}
      value={chosen ?? ''}
      onChange={(event) => {
        if (event.target.value !== '') onChoose(event.target.value)
      }}
      options={[...(chosen === undefined ? [{ value: '', label: 'Choose one' }] : []), ...descriptions.map((path) => ({ value: path, label: path }))]}
    />
  )
}
