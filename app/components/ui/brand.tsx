/** The mark: a turnstone's back, breast and eye stripe. */
export function BrandMark({ size }: { size: number }) {
  return (
    <svg className="flex-none" width={size} height={size} viewBox="0 0 32 32" aria-hidden="true">
      <path
        fill="var(--ink)"
        d="M4.2 18.5C3 12 7.5 4.6 15.5 3.6 23 2.7 29.3 8 29 15.6c-.3 8-6 12.9-13.2 12.7C9.5 28.2 5.2 24.5 4.2 18.5z"
      />
      <path
        fill="var(--rust)"
        d="M29 15.6c-.3 8-6 12.9-13.2 12.7-1.3 0-2.6-.2-3.7-.6 0-7.5 3.4-12.7 16.3-15.8.4 1.2.6 2.4.6 3.7z"
      />
      <path fill="none" stroke="var(--paper)" strokeWidth="2.6" d="M10.3 28.6C10.1 19.8 14 13.5 28.6 10.3" />
    </svg>
  )
}
