import { METHOD_NOTES } from './method-notes'

const ROWS = [['units', 'Units'], ['use', 'When'], ['cost', 'Cost'], ['caution', 'Caution']] as const

/** The notes of one section of the methods: units, when to use, what it costs, cautions, and the tests that prove it. */
export function MethodNoteList({ of }: { readonly of: keyof typeof METHOD_NOTES & string }) {
  return (METHOD_NOTES[of] ?? []).map(({ name, proofs, ...note }) => (
    <section key={name} aria-label={name} className="mt-4 border-l-2 border-hair pl-4 text-13 leading-5">
      <p className="font-semibold">{name}</p>
      <dl className="mt-1">
        {ROWS.map(([key, label]) => (
          <div key={key} className="tablet:grid tablet:grid-cols-[5rem_1fr] tablet:gap-3">
            <dt className="text-soft">{label}</dt>
            <dd>{note[key]}</dd>
          </div>
        ))}
        <div className="tablet:grid tablet:grid-cols-[5rem_1fr] tablet:gap-3">
          <dt className="text-soft">Proved by</dt>
          <dd>
            {proofs.map(({ file, title }) => (
              <span key={title} className="block break-words">
                &ldquo;{title}&rdquo; <span className="text-soft">in {file}</span>
              </span>
            ))}
          </dd>
        </div>
      </dl>
    </section>
  ))
}
