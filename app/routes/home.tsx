export const meta = () => [{ title: 'Turnstone' }]

export default function Home() {
  return (
    <main>
      <h1 className="h1">Turnstone</h1>
    </main>
  )
}
