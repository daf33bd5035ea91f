import express, { type Request, type RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
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

/** A body in another form than the operation reads would else look as if there were none; an empty one is none. */
const onlyKind =
  (mediaType: string): RequestHandler =>
  (request, _response, next) => {
    if (request.get('content-length') !== '0' && request.is(mediaType) === false) throw new HttpProblem(415, `Send the body as ${mediaType}.`);
    next();
  };

/** How the body of an operation is read. */
export function bodyReaderFor(endpoint: Endpoint): RequestHandler[] {
  if (endpoint.bodyKind === 'raw') return [raw];
  if (endpoint.bodyKind === 'multipart') return [onlyKind('multipart/form-data'), upload];
  return endpoint.method === 'get' ? [] : [onlyKind('application/json'), json];
}

const limits = {
  /** Guessing a password or a token: 10 tries in 5 minutes from one network address. */
  signIn: { windowMs: 5 * 60_000, limit: 10 },
  /** Letters sent on request: 5 in 15 minutes from one network address. */
  mail: { windowMs: 15 * 60_000, limit: 5 },
} as const;

/** The demo is one visitor who tries everything. */
const demoFactor = 20;
/** Tries that name one e-mail address, from all networks together: more than one person needs, so that a stranger does not easily shut them out. */
const namedFactor = 3;

function limiter(endpoint: Endpoint, services: Services, factor: number, keyGenerator: (request: Request) => string, skip: (request: Request) => boolean): RequestHandler[] {
  if (!endpoint.rateLimit) return [];
  const { windowMs, limit } = limits[endpoint.rateLimit];
  return [
    rateLimit({
      windowMs,
      limit: limit * factor * (services.settings.demo ? demoFactor : 1),
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      keyGenerator,
      skip,
      handler: (_request, response) => {
        const seconds = Math.ceil(windowMs / 1000);
        throw new HttpProblem(429, 'Wait a few minutes, then try again.', undefined, {}, { 'Retry-After': String(response.getHeader('Retry-After') ?? seconds) });
      },
    }),
  ];
}

/** The rate limit an operation asks for, by network address. Counted in this process: several processes allow as many times more. */
export const rateLimiterFor = (endpoint: Endpoint, services: Services): RequestHandler[] => limiter(endpoint, services, 1, (request) => ipKeyGenerator(request.ip ?? ''), () => false);

const namedEmail = (request: Request): string | null => {
  const email: unknown = (request.body as { email?: unknown } | undefined)?.email;
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : null;
};

/** A limit by the e-mail address that the body names, known or not: guessing from many networks is slow too. Runs once the body is read. */
export const namedAddressLimiterFor = (endpoint: Endpoint, services: Services): RequestHandler[] => limiter(endpoint, services, namedFactor, (request) => namedEmail(request) ?? '', (request) => namedEmail(request) === null);
