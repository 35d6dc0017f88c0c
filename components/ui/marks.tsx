/** Every mark of this product: plain strokes on one 16 px grid, in the colour of the text beside them. */
const STROKES = {
  released: 'M2 8.5 6 12.5 14 3.5',
  draft: 'M3 13l1-3.5L11 2.5l2.5 2.5L6.5 12z M9.5 4 12 6.5',
  'in-review': 'M1.5 8C3.5 4.5 12.5 4.5 14.5 8C12.5 11.5 3.5 11.5 1.5 8z M8 6.5v3',
  superseded: 'M3 3v10 M6.5 8H14 M10.5 4.5 14 8l-3.5 3.5',
  withdrawn: 'M3 3 13 13 M13 3 3 13',
  error: 'M8 1.5 14.5 8 8 14.5 1.5 8z M8 5v3.5 M8 10.5v1',
  warning: 'M8 2 15 14H1z M8 6.5v3.5 M8 11.5v1',
  note: 'M2.5 2.5h11v11h-11z M5.5 6.5h5 M5.5 9.5h5',
  revolute: 'M8 8m-2 0a2 2 0 1 0 4 0a2 2 0 1 0-4 0 M3 12A6.4 6.4 0 1 1 13 12 M10.5 12.5 13 12 13.5 14.5',
  continuous: 'M8 8m-2 0a2 2 0 1 0 4 0a2 2 0 1 0-4 0 M8 8m-6.2 0a6.2 6.2 0 1 0 12.4 0a6.2 6.2 0 1 0-12.4 0',
  prismatic: 'M1.5 12.5h13 M4 5.5h5v4H4z M11 7.5h3.5 M12.5 5.5l2 2-2 2',
  fixed: 'M5 3v10 M11 3v10 M5 8h6 M2.5 3h5 M8.5 3h5',
  floating: 'M5 5h6v6H5z M8 1v2.5 M8 12.5V15 M1 8h2.5 M12.5 8H15',
  planar: 'M1.5 11 5 5h9.5L11 11z M8 8v-4 M8 8h3.5',
  theme: 'M8 8m-6 0a6 6 0 1 0 12 0a6 6 0 1 0-12 0 M8 2v12 M8 5h5.2 M8 8h6 M8 11h5.2',
  menu: 'M2 4h12 M2 8h12 M2 12h12',
  close: 'M3.5 3.5 12.5 12.5 M12.5 3.5 3.5 12.5',
  narrowed: 'M3 4.5h10L8 12.5z',
} as const

export type MarkName = keyof typeof STROKES

/** One mark. Decoration to a screen reader: the word stands beside it. */
export function Mark({ name, className }: { readonly name: MarkName; readonly className?: string }) {
  return (
    <svg aria-hidden viewBox="0 0 16 16" className={className ?? 'size-3.5 shrink-0 self-center'} fill="none" stroke="currentColor" strokeWidth={1.6}>
      <path d={STROKES[name]} />
    </svg>
  )
}
