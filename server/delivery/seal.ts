import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';

// AES-256-GCM (NIST SP 800-38D): 96-bit nonce drawn anew each time, 128-bit tag.
const nonceBytes = 12;
const tagBytes = 16;
const form = 'v1';

const keyOf = (secret: Buffer): Buffer => Buffer.from(hkdfSync('sha256', secret, Buffer.alloc(0), 'dawnvane seal v1', 32));

/**
 * Encrypts a secret for the database.
 * @param secret the server's own secret, 32 bytes or more
 * @param purpose what the text is for; a text sealed for one purpose does not open for another
 */
export function seal(secret: Buffer, purpose: string, text: string): string {
  const nonce = randomBytes(nonceBytes);
  const cipher = createCipheriv('aes-256-gcm', keyOf(secret), nonce).setAAD(Buffer.from(purpose));
  const sealed = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return `${form}.${Buffer.concat([nonce, sealed, cipher.getAuthTag()]).toString('base64url')}`;
}

/**
 * Opens what `seal` closed.
 * @throws Error when the server's secret changed or the text was tampered with
 */
export function unseal(secret: Buffer, purpose: string, sealed: string): string {
  const [version, text] = sealed.split('.');
  const bytes = Buffer.from(text ?? '', 'base64url');
  if (version !== form || bytes.length < nonceBytes + tagBytes) throw new Error('A sealed secret has a form that is not known.');
  const decipher = createDecipheriv('aes-256-gcm', keyOf(secret), bytes.subarray(0, nonceBytes), { authTagLength: tagBytes })
    .setAAD(Buffer.from(purpose))
    .setAuthTag(bytes.subarray(bytes.length - tagBytes));
  try {
    return Buffer.concat([decipher.update(bytes.subarray(nonceBytes, bytes.length - tagBytes)), decipher.final()]).toString('utf8');
  } catch {
    throw new Error("A sealed secret does not open: the server's secret was changed or the database comes from elsewhere.");
  }
}
