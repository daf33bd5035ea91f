import { lookup as systemLookup, type LookupAddress } from 'node:dns';
import type { LookupFunction } from 'node:net';
import { Agent } from 'undici';
import { isAddress, isPublicAddress } from './addresses.ts';

/** A target that no call may be made to; the message is for the person who entered it. */
export class RefusedTarget extends Error {}

/** All addresses of a host name. */
export type Resolve = (host: string) => Promise<LookupAddress[]>;

const resolveBySystem: Resolve = (host) =>
  new Promise((resolve, reject) => {
    systemLookup(host, { all: true, verbatim: true }, (error, addresses) => (error ? reject(error) : resolve(addresses)));
  });

/** Checks the far ends of outgoing calls: when they are saved, and again at each connection, on the very address that is connected to. */
export interface Guard {
  /**
   * @throws RefusedTarget when the address is no https address, names a host within, or does not resolve
   */
  check(url: string): Promise<void>;
  /** `fetch` to a checked target: https only, no redirects, time-out, connected only to the addresses that were checked. */
  fetch(url: string, request: { headers: Record<string, string>; body: string | Uint8Array<ArrayBuffer>; timeoutMs: number }): Promise<Response>;
  stop(): Promise<void>;
}

/**
 * @param permittedHosts names that skip the check: test targets only
 * @param resolve gives all addresses of a name; the system's resolver when left out
 * @param ca certificate (PEM) to trust instead of the usual ones: of a local test target
 */
export function createGuard(permittedHosts: readonly string[], resolve: Resolve = resolveBySystem, ca?: string): Guard {
  const permitted = new Set(permittedHosts.map((host) => host.toLowerCase()));

  /** The addresses of a name, all of them public; one that is not refuses them all. */
  async function checked(host: string): Promise<LookupAddress[]> {
    const addresses = await resolve(host);
    if (addresses.length === 0) throw new RefusedTarget(`${host} has no address`);
    if (!permitted.has(host.toLowerCase()) && !addresses.every(({ address }) => isPublicAddress(address))) throw new RefusedTarget(`${host} leads to an address inside a private network`);
    return addresses;
  }

  function parsed(text: string): URL {
    const url = URL.canParse(text) ? new URL(text) : null;
    if (!url) throw new RefusedTarget('this is not an address');
    if (url.username || url.password) throw new RefusedTarget('an address must not carry a user name or password');
    if (permitted.has(url.hostname.toLowerCase())) return url;
    if (url.protocol !== 'https:') throw new RefusedTarget('the address must begin with https://');
    // URL has brought every odd spelling of an IPv4 address (hex, octal, one number) to its dotted form.
    if (isAddress(url.hostname) && !isPublicAddress(url.hostname)) throw new RefusedTarget(`${url.hostname} is an address inside a private network`);
    return url;
  }

  const lookup: LookupFunction = (host, options, callback) => {
    checked(host).then(
      (addresses) => {
        const wanted = options.family === 4 || options.family === 6 ? addresses.filter(({ family }) => family === options.family) : addresses;
        const [first] = wanted;
        if (!first) callback(new RefusedTarget(`${host} has no address of this kind`), '', 4);
        else if (options.all) (callback as unknown as (error: null, addresses: LookupAddress[]) => void)(null, wanted);
        else callback(null, first.address, first.family);
      },
      (error: Error) => callback(error, '', 4),
    );
  };
  const agent = new Agent({ connect: { lookup, timeout: 10_000, ...(ca ? { ca } : {}) }, connections: 64, keepAliveTimeout: 30_000, maxRedirections: 0 });

  return {
    async check(text) {
      const url = parsed(text);
      if (permitted.has(url.hostname.toLowerCase()) || isAddress(url.hostname)) return;
      try {
        await checked(url.hostname);
      } catch (error) {
        throw error instanceof RefusedTarget ? error : new RefusedTarget(`${url.hostname} is not known to the name service; check the spelling`);
      }
    },
    async fetch(text, { headers, body, timeoutMs }) {
      const init: RequestInit & { dispatcher: unknown } = { method: 'POST', headers, body, redirect: 'manual', signal: AbortSignal.timeout(timeoutMs), dispatcher: agent };
      return fetch(parsed(text), init as RequestInit);
    },
    stop: () => agent.close(),
  };
}
