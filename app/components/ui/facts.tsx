/** Facts as a ruled list: what, and how much. */
export function Facts({ facts }: { facts: readonly (readonly [name: string, value: string])[] }) {
  return (
    <dl className="border-t border-rule-strong">
      {facts.map(([name, value]) => (
        <div key={name} className="flex justify-between gap-4 border-b border-rule py-1.5">
          <dt className="text-ink-muted">{name}</dt>
          <dd className="num text-right">{value}</dd>
        </div>
      ))}
    </dl>
  )
}
