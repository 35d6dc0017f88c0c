const STEPS = [
  { title: 'Check', text: 'The importer reads the file and says everything it notices, with line and column, what follows from it and what to do. Nothing is stored.' },
  { title: 'Store', text: 'A file without errors becomes a draft: revision 1 of a new model, or a further revision. It is kept byte for byte, meshes included.' },
  { title: 'Review', text: 'A second person looks at the sheet and releases it. From then on its numbers can be asked for, and every answer names the revision.' },
] as const

/** What happens to a file, said where nothing is to be seen yet. */
export function ImportSteps() {
  return (
    <ol className="border-t border-ink">
      {STEPS.map(({ title, text }, i) => (
        <li key={title} className="grid grid-cols-[1.5rem_5rem_minmax(0,1fr)] gap-x-2 border-b border-hair px-2 py-3">
          <span className="num text-soft">{i + 1}</span>
          <span className="font-semibold">{title}</span>
          <span className="text-soft">{text}</span>
        </li>
      ))}
    </ol>
  )
}
