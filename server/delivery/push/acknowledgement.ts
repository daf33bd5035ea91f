import { createHash, createHmac } from 'node:crypto';

/**
 * Token by which a device tells that a push was shown or tapped. It is derived from the delivery, so that every try carries
 * the same one; the database keeps only its hash.
 */
export const acknowledgementToken = (secret: Buffer, deliveryId: string): string => createHmac('sha256', secret).update(`push acknowledgement ${deliveryId}`).digest('base64url');

export const acknowledgementHash = (token: string): string => createHash('sha256').update(token).digest('hex');
