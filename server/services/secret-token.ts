import { createHash, randomBytes } from 'node:crypto';

/** A random token of 256 bits, and the SHA-256 that the database keeps of it. */
export const newSecretToken = (): { token: string; hash: string } => {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: hashSecretToken(token) };
};

/** SHA-256 of a token in hexadecimal. A token is random, so it needs no salt and no slow hash. */
export const hashSecretToken = (token: string): string => createHash('sha256').update(token).digest('hex');
