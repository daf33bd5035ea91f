import { createDecipheriv, createECDH, createHmac } from 'node:crypto';

/** Keys of a subscription on the device's side (RFC 8291 §2), base64url. */
export interface ReceiverKeys {
  publicKey: string;
  privateKey: string;
  auth: string;
}

/** Every value on the way from message to text, named as in RFC 8291 Appendix A. */
export interface Decrypted {
  ecdhSecret: Buffer;
  prkKey: Buffer;
  keyInfo: Buffer;
  ikm: Buffer;
  prk: Buffer;
  cekInfo: Buffer;
  cek: Buffer;
  nonceInfo: Buffer;
  nonce: Buffer;
  plaintext: Buffer;
}

const hmac = (key: Buffer, ...parts: Buffer[]): Buffer => {
  const mac = createHmac('sha256', key);
  for (const part of parts) mac.update(part);
  return mac.digest();
};
const one = Buffer.from([1]);

/**
 * Decrypts one push message in the content coding aes128gcm (RFC 8188) with the keys of RFC 8291, written from the standard with
 * node:crypto alone, so that it checks the sender independently.
 * @throws Error when the message is not whole, not for these keys, or not in the form of the standard
 */
export function decryptPush(message: Buffer, keys: ReceiverKeys): Decrypted {
  if (message.length < 21 + 65 + 17) throw new Error('The message is too short for its header.');
  const salt = message.subarray(0, 16);
  const recordSize = message.readUInt32BE(16);
  const idLength = message.readUInt8(20);
  if (idLength !== 65) throw new Error('The key id must be the sender’s public key of 65 bytes.');
  const senderPublic = message.subarray(21, 21 + idLength);
  const record = message.subarray(21 + idLength);
  if (record.length > recordSize) throw new Error('A push message must be a single record.');
  const receiver = createECDH('prime256v1');
  receiver.setPrivateKey(Buffer.from(keys.privateKey, 'base64url'));
  const ecdhSecret = receiver.computeSecret(senderPublic);
  const prkKey = hmac(Buffer.from(keys.auth, 'base64url'), ecdhSecret);
  const keyInfo = Buffer.concat([Buffer.from('WebPush: info\0'), Buffer.from(keys.publicKey, 'base64url'), senderPublic]);
  const ikm = hmac(prkKey, keyInfo, one);
  const prk = hmac(salt, ikm);
  const cekInfo = Buffer.from('Content-Encoding: aes128gcm\0');
  const cek = hmac(prk, cekInfo, one).subarray(0, 16);
  const nonceInfo = Buffer.from('Content-Encoding: nonce\0');
  const nonce = hmac(prk, nonceInfo, one).subarray(0, 12);
  const decipher = createDecipheriv('aes-128-gcm', cek, nonce).setAuthTag(record.subarray(record.length - 16));
  const padded = Buffer.concat([decipher.update(record.subarray(0, record.length - 16)), decipher.final()]);
  // The last record ends with the delimiter 2 and zeros (RFC 8188 §2).
  let end = padded.length - 1;
  while (end >= 0 && padded[end] === 0) end -= 1;
  if (end < 0 || padded[end] !== 2) throw new Error('The padding delimiter of the last record is missing.');
  return { ecdhSecret, prkKey, keyInfo, ikm, prk, cekInfo, cek, nonceInfo, nonce, plaintext: padded.subarray(0, end) };
}
