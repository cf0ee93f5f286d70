import { createHash, randomBytes } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';

/** argon2id with a random salt, for passwords and PINs. */
export function hashSecret(secret: string): Promise<string> {
  return hash(secret);
}

let decoy: Promise<string> | undefined;

/** Whether the secret fits the hash. Without a hash the answer is no, after the same work, so that time tells nothing. */
export async function secretFits(secretHash: string | null, secret: string): Promise<boolean> {
  decoy ??= hashSecret(randomBytes(16).toString('hex'));
  const fits = await verify(secretHash ?? (await decoy), secret);
  return secretHash !== null && fits;
}

/** 256 random bits for a link or a cookie; only its hash is kept. */
export function makeToken(): string {
  return randomBytes(32).toString('base64url');
}

/** SHA-256, hexadecimal. Enough for random tokens, which cannot be guessed from a list. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
