import { hash, verify } from '@node-rs/argon2';

/** argon2id with 19 MiB, 2 passes, 1 lane (OWASP password storage guidance, from memory). The algorithm's default is argon2id. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Hash of a password, with its salt and cost inside. */
export const hashPassword = (password: string): Promise<string> => hash(password, cost);

let decoy: Promise<string> | null = null;

/**
 * Whether the password is the one hashed. With no hash (an unknown address) the same work is done on a decoy, so that the
 * time of the answer tells nothing.
 */
export async function passwordMatches(passwordHash: string | null, password: string): Promise<boolean> {
  decoy ??= hashPassword('a password that nobody has');
  const matches = await verify(passwordHash ?? (await decoy), password);
  return passwordHash !== null && matches;
}
