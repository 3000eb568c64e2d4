import { hash, verify } from '@node-rs/argon2';

/**
 * Cost of Argon2id: 19 MiB, two passes, one lane. Values of the OWASP Password Storage Cheat Sheet, from memory. The
 * variant is the package's default.
 */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The hash of a password, with its salt and cost inside. */
export async function hashPassword(password: string): Promise<string> {
  return hash(password, cost);
}

let standIn: Promise<string> | undefined;

/**
 * Whether the password belongs to the hash. Without a hash (no such account) it takes the same time and says no, so that
 * nobody learns from the clock which addresses have an account.
 */
export async function isPassword(password: string, passwordHash: string | null): Promise<boolean> {
  standIn ??= hashPassword('the password of nobody');
  const matches = await verify(passwordHash ?? (await standIn), password);
  return matches && passwordHash !== null;
}
