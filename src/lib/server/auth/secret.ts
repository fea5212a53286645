import { createHash, randomBytes } from 'node:crypto';

/** A fresh secret for a link or a token: 256 bits, safe in an address. */
export const newSecret = () => randomBytes(32).toString('base64url');

/** What is stored of a secret: SHA-256 in hex. A secret of 256 random bits needs no slow hash. */
export const hashOf = (secret: string) => createHash('sha256').update(secret).digest('hex');
