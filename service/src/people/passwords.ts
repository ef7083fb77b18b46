import { hash, verify } from '@node-rs/argon2';

/** Argon2id with the package's defaults raised to 19 MiB and two passes (OWASP's least). */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, cost);
}

let stranger: Promise<string> | null = null;

/**
 * Does the password fit the hash? For a person who does not exist a hash of nobody's is checked, so that the
 * time taken does not tell which e-mail addresses are known.
 */
export async function passwordFits(passwordHash: string | null, password: string): Promise<boolean> {
  stranger ??= hashPassword('nobody has this password');
  const fits = await verify(passwordHash ?? (await stranger), password);
  return passwordHash !== null && fits;
}
