import type { ReactNode } from 'react'
import { Icon, type IconName } from './icon'

/** What went wrong, what happened, and one way on. Marked by a rule in danger's colour. */
export function ErrorNotice({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div role="alert" className="problem">
      <p>
        <strong>{title}</strong>
      </p>
      {children}
    </div>
  )
}

const TOASTS = {
  done: { look: 'toast', icon: 'check', role: 'status' },
  caution: { look: 'toast toast-caution', icon: 'warning', role: 'status' },
  danger: { look: 'toast toast-danger', icon: 'cross', role: 'alert' },
} as const satisfies Record<string, { look: string; icon: IconName; role: string }>

/** One line over a page: what was just done, or what to know, with at most one thing to do about it. */
export function Toast({ kind, children }: { kind: keyof typeof TOASTS; children: ReactNode }) {
  const { look, icon, role } = TOASTS[kind]
  return (
    <div role={role} className={look}>
      <Icon name={icon} size={18} />
      {children}
    </div>
  )
}

/** A fact of the drawing or the file to know of, one line in a list of them. */
export function Caution({ children }: { children: ReactNode }) {
  return (
    <li className="flex gap-2 border-b border-rule py-2">
      <span className="mt-0.5 text-caution">
        <Icon name="warning" />
      </span>
      <span className="min-w-0">{children}</span>
    </li>
  )
}
