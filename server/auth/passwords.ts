import { hash, verify } from '@node-rs/argon2';

/** argon2id (the package's enum is ambient, hence the number) with OWASP's 19 MiB, two passes, one lane. */
const options = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string) => hash(password, options);

/** Whether the password belongs to the hash; a hash that can't be read matches nothing. */
export async function passwordMatches(passwordHash: string, password: string): Promise<boolean> {
  try {
    return await verify(passwordHash, password);
  } catch {
    return false;
  }
}
