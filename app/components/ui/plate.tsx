/** A corner's number on its plate; orange where a question is open. */
export function NumberPlate({ number, open = false }: { number: string; open?: boolean }) {
  return <span className={open ? 'plate plate-open' : 'plate'}>{number}</span>
}
