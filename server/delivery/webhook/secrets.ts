import { randomBytes } from 'node:crypto';
import { seal, unseal } from '../seal.ts';

/** Standard Webhooks 1.0.0: 24 to 64 random bytes, shown as base64 behind a prefix. */
export const newWebhookSecret = (): string => `whsec_${randomBytes(32).toString('base64')}`;

const purpose = 'webhook secret';
export const sealWebhookSecret = (serverSecret: Buffer, webhookSecret: string): string => seal(serverSecret, purpose, webhookSecret);
export const unsealWebhookSecret = (serverSecret: Buffer, sealed: string): string => unseal(serverSecret, purpose, sealed);
