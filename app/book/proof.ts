import type { ConditionId, PersonId } from './ids'
import { type FindingVerdict, PROOFS, type Proof } from './kinds'
import type { ProofView } from './view'

/** A finding as stored: what someone found of one place of a mark. Metres of the drawn line. */
export interface FindingRow {
  /** Whose proof it is. */
  person: PersonId
  /** Who said, saw or drove it. */
  by: PersonId
  condition: ConditionId
  verdict: FindingVerdict
  proof: Proof
  along: number
  across: number
  /** Instant, ISO 8601. */
  at: string
}

/** A finding speaks of the place where it was made: it proves a place no further than this from it, in metres. */
export const PROOF_REACH = 1

/** How two proofs compare: positive when `a` is stronger. */
export const compareProof = (a: Proof, b: Proof) => PROOFS.indexOf(a) - PROOFS.indexOf(b)

/**
 * What the findings of one place amount to now: per person and condition the strongest finding that still speaks of where the
 * place is. A later `gone` takes away everything that person found before it. Moving a place by more than `PROOF_REACH`
 * leaves its findings behind: its proof is told again.
 * @param place metres of the drawn line
 * @param length lap length in metres, for places on both sides of the drawn line's first position
 */
export function proofOf(place: { along: number; across: number }, findings: readonly FindingRow[], length: number) {
  const best = new Map<string, ProofView>()
  const inOrder = [...findings].sort((a, b) => (a.at < b.at ? -1 : a.at > b.at ? 1 : 0))
  for (const finding of inOrder) {
    const key = `${finding.person} ${finding.condition}`
    if (finding.verdict === 'gone') {
      best.delete(key)
      continue
    }
    if (!speaksOf(finding, place, length)) continue
    const known = best.get(key)
    if (known && compareProof(known.proof, finding.proof) > 0) continue
    best.set(key, {
      person: finding.person,
      condition: finding.condition,
      proof: finding.proof,
      by: finding.by,
      at: finding.at,
      verdict: finding.verdict,
    })
  }
  return [...best.values()]
}

function speaksOf(finding: FindingRow, place: { along: number; across: number }, length: number) {
  const apart = Math.abs(finding.along - place.along)
  const alongRoad = Math.min(apart, length - apart)
  return Math.hypot(alongRoad, finding.across - place.across) <= PROOF_REACH
}

/** The team's best proof in a condition: the strongest of anyone, the latest of equals. Without any finding a place is told. */
export function bestProof(proofs: readonly ProofView[], condition: ConditionId): ProofView | null {
  return strongest(proofs.filter((proof) => proof.condition === condition))
}

/** A person's own best proof in a condition. Proof is never inherited from another condition. */
export function ownProof(proofs: readonly ProofView[], condition: ConditionId, person: PersonId): ProofView | null {
  return strongest(proofs.filter((proof) => proof.condition === condition && proof.person === person))
}

function strongest(proofs: readonly ProofView[]): ProofView | null {
  return proofs.reduce<ProofView | null>((best, proof) => {
    if (!best) return proof
    const order = compareProof(proof.proof, best.proof)
    return order > 0 || (order === 0 && proof.at > best.at) ? proof : best
  }, null)
}
