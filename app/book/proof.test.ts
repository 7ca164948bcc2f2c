import { describe, expect, it } from 'vitest'
import { ids } from '../../tests/support/book-rows'
import { bestProof, type FindingRow, ownProof, proofOf } from './proof'

const LAP = 2000
const at = { along: 395, across: 4 }
const finding = (more: Partial<FindingRow>): FindingRow => ({
  person: ids.driver,
  by: ids.driver,
  condition: ids.dry,
  verdict: 'kept',
  proof: 'seen',
  along: 395,
  across: 4,
  at: '2026-10-09T10:00:00Z',
  ...more,
})

describe('proof of a place', () => {
  it('keeps the strongest finding per person and condition', () => {
    const proofs = proofOf(
      at,
      [
        finding({ proof: 'driven', at: '2026-09-12T10:00:00Z' }),
        finding({ proof: 'seen' }),
        finding({ person: ids.coach, proof: 'told' }),
        finding({ condition: ids.wet, proof: 'seen' }),
      ],
      LAP,
    )
    expect(proofs).toHaveLength(3)
    expect(ownProof(proofs, ids.dry, ids.driver)?.proof).toBe('driven')
    expect(ownProof(proofs, ids.dry, ids.coach)?.proof).toBe('told')
  })

  it('falls back to told when the place is moved by more than a metre', () => {
    const findings = [finding({ proof: 'driven' })]
    expect(proofOf({ along: 395.9, across: 4 }, findings, LAP)).toHaveLength(1)
    expect(proofOf({ along: 396.1, across: 4 }, findings, LAP)).toEqual([])
    expect(proofOf({ along: 395, across: 5.1 }, findings, LAP)).toEqual([])
  })

  it('measures a move across the first position of the drawn line the short way round', () => {
    expect(proofOf({ along: 0.3, across: 4 }, [finding({ along: 1999.8 })], LAP)).toHaveLength(1)
  })

  it('takes away what a person found before saying that it is gone, of no one else', () => {
    const proofs = proofOf(
      at,
      [
        finding({ proof: 'driven', at: '2026-09-12T10:00:00Z' }),
        finding({ person: ids.coach, at: '2026-09-13T10:00:00Z' }),
        finding({ verdict: 'gone', at: '2026-10-09T10:00:00Z' }),
      ],
      LAP,
    )
    expect(proofs.map((proof) => proof.person)).toEqual([ids.coach])
  })

  it('tells the team’s best, the latest of equals, never from another condition', () => {
    const proofs = proofOf(
      at,
      [
        finding({ at: '2026-10-08T10:00:00Z' }),
        finding({ person: ids.coach, at: '2026-10-09T12:00:00Z' }),
        finding({ person: ids.coach, condition: ids.wet, proof: 'driven' }),
      ],
      LAP,
    )
    expect(bestProof(proofs, ids.dry)).toMatchObject({ person: ids.coach, proof: 'seen' })
    expect(bestProof([], ids.dry)).toBeNull()
  })
})
