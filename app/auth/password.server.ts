import { hash, verify } from '@node-rs/argon2'

/**
 * Password hashes: argon2id (RFC 9106) with 19 MiB of memory, 2 passes, 1 lane, the least that OWASP's Password Storage
 * Cheat Sheet names for it. Passwords are taken in Unicode's composed compatibility form, so that two keyboards that write
 * "é" differently mean the same password (NIST SP 800-63B, 5.1.1.2).
 */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const

const normal = (password: string) => password.normalize('NFKC')

/** Hash of a password in PHC string form, with a fresh salt. */
export function hashPassword(password: string): Promise<string> {
  return hash(normal(password), COST)
}

/**
 * Whether this is the password of that hash. With `null`, for an address nobody has or a person without a password, the
 * same work is done and the answer is no, so that the time taken tells nothing.
 */
export async function verifyPassword(hashed: string | null, password: string): Promise<boolean> {
  const matches = await verify(hashed ?? (await nobodysHash()), normal(password))
  return hashed !== null && matches
}

let nobodys: Promise<string> | undefined

/** The hash that stands in where there is none; made once a process. */
function nobodysHash(): Promise<string> {
  nobodys ??= hashPassword('stands in where nobody has a password')
  return nobodys
}

/** Makes the stand-in hash ahead of the first sign-in, so that also that one takes as long as any other. */
export async function warmUp(): Promise<void> {
  await nobodysHash()
}
