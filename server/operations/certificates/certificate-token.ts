import { randomBytes } from 'node:crypto';
import { sha256 } from '../trail/sha256';

/** 128 random bits, as they stand in the address on the paper. */
export function newCertificateToken(): string {
  return randomBytes(16).toString('base64url');
}

/** What is stored of it; null for a text that is no token. */
export function certificateTokenHash(token: string): string | null {
  return /^[A-Za-z0-9_-]{22}$/.test(token) ? sha256(token) : null;
}
