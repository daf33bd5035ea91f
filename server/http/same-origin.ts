import type { RequestHandler } from 'express';
import type { AppSettings } from '../services.ts';
import { HttpProblem } from './problem.ts';

/** Operations that other machines call; they bear no cookie and prove themselves by signature or token. */
const machinePaths = /^\/(hooks\/|push\/acknowledge$|mail\/)/;

/**
 * Defence against cross-site request forgery, beside same-site cookies: whatever changes state must come from our own
 * pages, told by the Origin header or, where a browser sends none, by Sec-Fetch-Site.
 */
export function sameOriginOnly(settings: AppSettings): RequestHandler {
  return (request, _response, next) => {
    if (request.method === 'GET' || request.method === 'HEAD' || request.method === 'OPTIONS' || machinePaths.test(request.path)) {
      next();
      return;
    }
    const origin = request.get('origin');
    const own = origin !== undefined ? origin === settings.publicUrl || origin === `${request.protocol}://${request.get('host') ?? ''}` : request.get('sec-fetch-site') === 'same-origin';
    if (!own) throw new HttpProblem(403, "This request does not come from Dawnvane's own pages (no matching Origin header).");
    next();
  };
}
