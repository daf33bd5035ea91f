import express, { type RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import multer from 'multer';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import type { Services } from '../services.ts';
import { HttpProblem } from './problem.ts';

const megabyte = 1024 * 1024;
/** Largest label file taken. */
export const labelFileBytesMax = 10 * megabyte;

const json = express.json({ limit: '512kb' });
const raw = express.raw({ type: () => true, limit: '2mb' });
const upload = multer({ storage: multer.memoryStorage(), limits: { fileSize: labelFileBytesMax, files: 1, fields: 5 } }).single('file');

/** How the body of an operation is read. */
export function bodyReaderFor(endpoint: Endpoint): RequestHandler[] {
  if (endpoint.bodyKind === 'raw') return [raw];
  if (endpoint.bodyKind === 'multipart') return [upload];
  return endpoint.method === 'get' ? [] : [json];
}

const limits = {
  /** Guessing a password or a token: 10 tries in 5 minutes from one address. */
  signIn: { windowMs: 5 * 60_000, limit: 10 },
  /** Letters sent on request: 5 in 15 minutes from one address. */
  mail: { windowMs: 15 * 60_000, limit: 5 },
} as const;

/** The rate limit an operation asks for. The demo and tests may widen it through `settings`. */
export function rateLimiterFor(endpoint: Endpoint, services: Services): RequestHandler[] {
  if (!endpoint.rateLimit) return [];
  const { windowMs, limit } = limits[endpoint.rateLimit];
  return [
    rateLimit({
      windowMs,
      limit: limit * (services.settings.demo ? 20 : 1),
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      handler: (_request, response) => {
        const seconds = Math.ceil(windowMs / 1000);
        throw new HttpProblem(429, `Wait a few minutes, then try again.`, undefined, {}, { 'Retry-After': String(response.getHeader('Retry-After') ?? seconds) });
      },
    }),
  ];
}
