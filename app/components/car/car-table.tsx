import { Link } from 'react-router'
import { metres } from '~/track/units'
import { carWords as words } from '~/words/cars'
import { formatMetres } from '~/words/measures'

interface CarTableProps {
  cars: readonly { id: string; name: string; length: number; width: number; eyeHeight: number }[]
  /** Address of the form that changes a car; none where this person may not. */
  changePath: ((car: string) => string) | null
}

/** The cars of a team with their measures. */
export function CarTable({ cars, changePath }: CarTableProps) {
  return (
    <table className="ruled">
      <thead>
        <tr>
          <th scope="col">{words.columns.name}</th>
          <th scope="col" className="r">
            {words.columns.length}
          </th>
          <th scope="col" className="r">
            {words.columns.width}
          </th>
          <th scope="col" className="r">
            {words.columns.eye}
          </th>
        </tr>
      </thead>
      <tbody>
        {cars.map((car) => (
          <tr key={car.id}>
            <th scope="row" className="wrap-anywhere">
              {changePath ? (
                <Link
                  className="inline-flex min-h-11 underline items-center min-[800px]:min-h-0"
                  to={changePath(car.id)}
                >
                  {car.name}
                </Link>
              ) : (
                car.name
              )}
            </th>
            <td className="num r">{formatMetres(metres(car.length), 2)}</td>
            <td className="num r">{formatMetres(metres(car.width), 2)}</td>
            <td className="num r">{formatMetres(metres(car.eyeHeight), 2)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
