/** One line of the bench: a figure of ours against a reference measured in the same run, and what it should come to. */
export interface BenchRow {
  name: string
  ours: number
  reference: number
  /** Ours over reference, or reference over ours where the name says "times faster". */
  ratio: number
  /** In words: "≤ 1.5". */
  aim: string
  met: boolean
}

/** The middle of some figures, the mean of the two middle ones of an even number. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b)
  const half = sorted.length / 2
  return sorted.length % 2 === 1 ? sorted[Math.floor(half)]! : (sorted[half - 1]! + sorted[half]!) / 2
}

const figure = (value: number) => (Number.isInteger(value) ? String(value) : value.toPrecision(3))

/** Rows as a table in columns. */
export function tableOf(rows: readonly BenchRow[]): string {
  const head = ['', 'ours', 'reference', 'ratio', 'aim', '']
  const lines = rows.map((row) => [
    row.name,
    figure(row.ours),
    figure(row.reference),
    figure(row.ratio),
    row.aim,
    row.met ? 'met' : 'NOT MET',
  ])
  const widths = head.map((_, column) => Math.max(...[head, ...lines].map((line) => line[column]!.length)))
  return [head, ...lines]
    .map((line) => line.map((cell, i) => (i === 0 ? cell.padEnd(widths[i]!) : cell.padStart(widths[i]!))).join('  '))
    .join('\n')
}
