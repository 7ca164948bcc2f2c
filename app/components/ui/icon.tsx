/** Line icons in a 20 box, drawn in the colour of their text. Decoration beside a word, never in its place. */
const PATHS = {
  plus: ['M10 4v12M4 10h12'],
  check: ['M4 10.5l4 4 8-9'],
  cross: ['M5 5l10 10M15 5L5 15'],
  down: ['M5 8l5 5 5-5'],
  left: ['M12 5l-5 5 5 5'],
  right: ['M8 5l5 5-5 5'],
  pencil: ['M4 16l.8-3.4L13.4 4l2.6 2.6-8.6 8.6z'],
  question: ['M6.5 7a3.5 3.5 0 1 1 5.2 3c-1.2.7-1.7 1.3-1.7 2.7', 'M10 15.6v.9'],
  warning: ['M10 3.5l7 12.5H3z', 'M10 8.2v3.6M10 13.7v.6'],
  undo: ['M7.5 4.5L4 8l3.5 3.5', 'M4 8h7.5a4.5 4.5 0 0 1 0 9H9'],
  turn: ['M4 7h10l-3-3M16 13H6l3 3'],
  flag: ['M5 17V3.5M5 4.5h9l-2 3 2 3H5'],
} as const

export type IconName = keyof typeof PATHS

export function Icon({ name, size = 16 }: { name: IconName; size?: number }) {
  return (
    <svg
      className="flex-none"
      width={size}
      height={size}
      viewBox="0 0 20 20"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      strokeLinejoin="round"
      strokeLinecap="round"
      aria-hidden="true"
    >
      {PATHS[name].map((d) => (
        <path key={d} d={d} />
      ))}
    </svg>
  )
}
