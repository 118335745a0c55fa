import { hash, verify } from '@node-rs/argon2';

// argon2id at OWASP's minimum cost (Password Storage Cheat Sheet): 19 MiB, 2 passes.
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Verified against when an account does not exist, so that the time taken tells nothing. */
let decoy: Promise<string> | undefined;

export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

/** True when `password` belongs to `stored`; a null `stored` costs the same time and is false. */
export async function checkPassword(stored: string | null, password: string): Promise<boolean> {
  decoy ??= hash('no account has this password', COST);
  const right = await verify(stored ?? (await decoy), password);
  return stored !== null && right;
}
