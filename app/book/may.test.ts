import { describe, expect, it } from 'vitest'
import { ids } from '../../tests/support/book-rows'
import { ACTIONS, type Action, type Actor } from './actions'
import type { TeamId } from './ids'
import { ROLES, type Role } from './kinds'
import { READS } from './matrix'
import { may } from './may'

const team = 'team' as TeamId
const as = (role: Role): Actor => ({ kind: 'person', person: ids.driver, team, role })
const job: Actor = { kind: 'job', name: 'night', team }
const allowed = (role: Role) => ACTIONS.filter((action) => may(as(role), action, { madeBy: ids.coach }).ok)

describe('who may what', () => {
  it('lets a driver read, add, edit cards and say what was found, and nothing of the desk', () => {
    expect(allowed('driver')).toEqual([
      'book.read',
      'card.change',
      'mark.add',
      'finding.add',
      'circuit.read',
      'landmark.add',
      'car.read',
      'edition.read',
      'notice.raise',
      'team.read',
    ])
  })

  it('keeps people and archiving for the manager alone', () => {
    const missing = (role: Role) => ACTIONS.filter((action) => !may(as(role), action).ok)
    expect(missing('coach')).toEqual(['book.archive', 'people.manage'])
    expect(missing('manager')).toEqual([])
  })

  it('lets a driver change his own mark and says of another’s that it is another’s', () => {
    expect(may(as('driver'), 'mark.change', { madeBy: ids.driver })).toEqual({ ok: true })
    expect(may(as('driver'), 'mark.change', { madeBy: ids.coach })).toEqual({ ok: false, reason: 'another-persons' })
  })

  it('lets only the desk say what another found', () => {
    const answers = ROLES.map((role) => [role, may(as(role), 'finding.add-for-another')])
    expect(Object.fromEntries(answers)).toEqual({
      manager: { ok: true },
      coach: { ok: true },
      driver: { ok: false, reason: 'role' },
    })
  })

  it('lets nobody change an archived book', () => {
    const writes: Action[] = ACTIONS.filter((action) => !READS.has(action) && action !== 'book.archive')
    for (const role of ROLES)
      for (const action of writes) expect(may(as(role), action, { archived: true }).ok, `${role} ${action}`).toBe(false)
    for (const action of writes)
      expect(may(job, action, { archived: true }), action).toEqual({ ok: false, reason: 'read-only' })
    for (const actor of [as('driver'), job]) expect(may(actor, 'book.read', { archived: true }).ok).toBe(true)
    for (const actor of [as('manager'), job]) expect(may(actor, 'book.archive', { archived: true }).ok).toBe(true)
  })

  it('lets a job do everything for its team in a book that is not archived', () => {
    for (const action of ACTIONS) expect(may(job, action, { madeBy: ids.coach }), action).toEqual({ ok: true })
  })

  it('lets a stranger do nothing at all', () => {
    for (const action of ACTIONS)
      expect(may({ kind: 'stranger' }, action)).toEqual({ ok: false, reason: 'not-a-member' })
  })
})
