/**
 * Middles of boxes along a line, moved as little as can be so that none overlaps the next: least squares over the order
 * given. Source: pool adjacent violators (Ayer et al., Ann. Math. Stat. 26, 1955).
 * @param wanted middles in rising order
 * @param widths of the boxes, the gap between two included
 * @param from start and `to` end of the room; where it is too small the boxes run over both ends evenly
 */
export function spread(wanted: readonly number[], widths: readonly number[], from: number, to: number): number[] {
  const starts: number[] = []
  let run = 0
  for (const width of widths) {
    starts.push(run + width / 2)
    run += width
  }
  const pools: { sum: number; count: number }[] = []
  for (const [i, middle] of wanted.entries()) {
    pools.push({ sum: middle - starts[i]!, count: 1 })
    for (let last = pools.at(-1)!, before = pools.at(-2); before; last = pools.at(-1)!, before = pools.at(-2)) {
      if (before.sum / before.count <= last.sum / last.count) break
      pools.splice(-2, 2, { sum: before.sum + last.sum, count: before.count + last.count })
    }
  }
  const room = to - from - run
  const [least, most] = room < 0 ? [from + room / 2, from + room / 2] : [from, from + room]
  const moved = pools.flatMap(({ sum, count }) => new Array<number>(count).fill(sum / count))
  return moved.map((shift, i) => Math.min(Math.max(shift, least), most) + starts[i]!)
}
