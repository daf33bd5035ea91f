import canonicalize from 'canonicalize';

/** SHA-256 of a UTF-8 text as 64 lower-case hex digits; given by the caller, since each platform has its own. */
export type Sha256 = (text: string) => string;

/** What the first entry of a farm's chain follows. */
export const chainStart = '0'.repeat(64);

/**
 * One version of one record, as signed. Entries are only ever added: a correction is a new version, and the old one stays readable.
 * The chain is the farm's: each entry's hash covers the one before, whatever record it belongs to.
 */
export interface ChainEntry<T> {
  /** Place in the farm's chain, from 1. */
  sequence: number;
  recordId: string;
  /** Version of this record, from 1. */
  version: number;
  content: T;
  /** Why it was corrected; empty for version 1. */
  reason: string;
  author: { id: string; name: string };
  /** UTC instant of the signature. */
  signedAt: string;
  previousHash: string;
  hash: string;
}

/** JSON in its one canonical form [rfc8785]. @throws when the value is no JSON (NaN, a function, a circle, a lone surrogate) */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new TypeError('Only JSON can be put into canonical form.');
  return text;
}

/** Hash of an entry: SHA-256 over the previous hash, a line feed and the entry's canonical JSON. */
export const chainHash = (previousHash: string, json: string, sha256: Sha256): string => sha256(`${previousHash}\n${json}`);

/** All of an entry but its hash and the previous one. */
function coveredBy<T>({ sequence, recordId, version, content, reason, author, signedAt }: ChainEntry<T>): string {
  return canonicalJson({ sequence, recordId, version, content, reason, author, signedAt });
}

/** The last entry of the farm's chain, and of the record when it has versions already. */
export interface ChainHead {
  sequence: number;
  hash: string;
  signedAt: string;
}

/**
 * The next entry of a farm's chain.
 * @param head of the farm's chain; null for the first entry @param lastVersion of this record; 0 for a new one
 * @throws RangeError for a correction without a reason, a first version with one, or a time before the head's
 */
export function nextEntry<T>(head: ChainHead | null, lastVersion: number, signed: Pick<ChainEntry<T>, 'recordId' | 'content' | 'reason' | 'author' | 'signedAt'>, sha256: Sha256): ChainEntry<T> {
  const reason = signed.reason.trim();
  if (lastVersion > 0 && reason === '') throw new RangeError('reason must say why the signed record is corrected.');
  if (lastVersion === 0 && reason !== '') throw new RangeError('reason must be empty for a record that was not signed before.');
  if (head !== null && Date.parse(signed.signedAt) < Date.parse(head.signedAt)) throw new RangeError(`signedAt must not be before the last signature, ${head.signedAt}.`);
  const previousHash = head?.hash ?? chainStart;
  const entry = { sequence: (head?.sequence ?? 0) + 1, recordId: signed.recordId, version: lastVersion + 1, content: signed.content, reason, author: signed.author, signedAt: signed.signedAt, previousHash, hash: '' };
  return { ...entry, hash: chainHash(previousHash, coveredBy(entry), sha256) };
}

export type ChainFault = 'sequence' | 'version' | 'reason' | 'previousHash' | 'hash' | 'head';

export interface ChainCheck {
  isWhole: boolean;
  entries: number;
  /** Hash of the last entry, to be written down elsewhere: only so is a chain that was cut short found out. */
  head: string;
  /** The first fault; sequence is the place it was found at. */
  fault: { sequence: number; kind: ChainFault } | null;
}

/**
 * Walks a farm's whole chain in order and finds the first entry that was changed, dropped, added or moved.
 * @param expectedHead a head noted earlier; it must be somewhere in the chain
 */
export function verifyChain<T>(entries: readonly ChainEntry<T>[], sha256: Sha256, expectedHead?: string): ChainCheck {
  let head = chainStart;
  let isHeadSeen = expectedHead === undefined || expectedHead === chainStart;
  const versions = new Map<string, number>();
  const faultOf = (entry: ChainEntry<T>, index: number): ChainFault | null => {
    if (entry.sequence !== index + 1) return 'sequence';
    if (entry.version !== (versions.get(entry.recordId) ?? 0) + 1) return 'version';
    if ((entry.version === 1) !== (entry.reason === '')) return 'reason';
    if (entry.previousHash !== head) return 'previousHash';
    return chainHash(head, coveredBy(entry), sha256) === entry.hash ? null : 'hash';
  };
  for (const [index, entry] of entries.entries()) {
    const kind = faultOf(entry, index);
    if (kind !== null) return { isWhole: false, entries: entries.length, head, fault: { sequence: index + 1, kind } };
    versions.set(entry.recordId, entry.version);
    head = entry.hash;
    isHeadSeen ||= head === expectedHead;
  }
  return { isWhole: isHeadSeen, entries: entries.length, head, fault: isHeadSeen ? null : { sequence: entries.length, kind: 'head' } };
}

/** The version of each record that holds: its last one. */
export function currentVersions<T>(entries: readonly ChainEntry<T>[]): Map<string, ChainEntry<T>> {
  const current = new Map<string, ChainEntry<T>>();
  for (const entry of entries) if (entry.version > (current.get(entry.recordId)?.version ?? 0)) current.set(entry.recordId, entry);
  return current;
}
