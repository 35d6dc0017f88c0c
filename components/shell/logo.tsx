/** The product's mark: an arm that bends at the elbow. */
export function Logo({ className }: { readonly className?: string }) {
  return (
    <svg aria-hidden viewBox="0 0 22 22" className={className ?? 'size-[22px]'} fill="none" stroke="currentColor" strokeWidth={2}>
      <path d="M3 19 10 8l9 3" />
      <circle cx={10} cy={8} r={3} fill="var(--sheet)" />
    </svg>
  )
}
