import type { ButtonHTMLAttributes } from 'react'
import { Link, type LinkProps } from 'react-router'

/** `primary` ends a form, `go` is the one thing to begin with on a page, `quiet` leaves without doing. */
export type ButtonLook = 'plain' | 'primary' | 'go' | 'quiet' | 'danger'
export type ButtonSize = 'small' | 'middle' | 'large'

interface Shape {
  look?: ButtonLook
  size?: ButtonSize
}

const LOOKS: Record<ButtonLook, string> = {
  plain: '',
  primary: ' btn-primary',
  go: ' btn-go',
  quiet: ' btn-quiet',
  danger: ' btn-danger',
}
const SIZES: Record<ButtonSize, string> = { small: ' btn-small', middle: '', large: ' btn-large' }

const classOf = ({ look = 'plain', size = 'middle' }: Shape, more = '') => `btn${LOOKS[look]}${SIZES[size]} ${more}`

/** A button that does something. */
export function Button({ look, size, className, ...rest }: Shape & ButtonHTMLAttributes<HTMLButtonElement>) {
  return <button type="submit" className={classOf({ look, size }, className)} {...rest} />
}

/** A link that looks like a button: it goes somewhere. */
export function ButtonLink({ look, size, className, ...rest }: Shape & LinkProps) {
  return <Link className={classOf({ look, size }, className)} {...rest} />
}
