import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bestObserved, recordProblems, type ApplicationRecord, type Observed } from './application-record.ts';
import { canonicalJson, chainHash, chainStart, currentVersions, nextEntry, verifyChain, type ChainEntry } from './chain.ts';
import { csvText } from './csv.ts';

const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex');
const author = { id: 'u', name: 'Ada Fern' };
interface Content {
  amount: number;
}

/** A chain of a first version and its correction, and another record in between. */
function chainOf(steps: readonly { recordId: string; amount: number; reason: string }[]): ChainEntry<Content>[] {
  const entries: ChainEntry<Content>[] = [];
  for (const [index, { recordId, amount, reason }] of steps.entries()) {
    const last = entries.filter((entry) => entry.recordId === recordId).length;
    entries.push(nextEntry(entries.at(-1) ?? null, last, { recordId, content: { amount }, reason, author, signedAt: new Date(Date.UTC(2026, 4, 12, 13, index)).toISOString() }, sha256));
  }
  return entries;
}
const three = () => chainOf([{ recordId: 'a', amount: 1, reason: '' }, { recordId: 'b', amount: 2, reason: '' }, { recordId: 'a', amount: 3, reason: 'read the cup wrong' }]);

describe('a farm’s chain of signed records', () => {
  it('is whole, keeps the old version readable, and tells the version that holds', () => {
    const entries = three();
    expect(verifyChain(entries, sha256)).toEqual({ isWhole: true, entries: 3, head: entries[2]!.hash, fault: null });
    expect(entries.filter(({ recordId }) => recordId === 'a').map(({ version, content }) => [version, content.amount])).toEqual([[1, 1], [2, 3]]);
    expect(currentVersions(entries).get('a')).toMatchObject({ version: 2, reason: 'read the cup wrong', content: { amount: 3 } });
  });

  it('hashes the previous hash, a line feed and the canonical JSON with SHA-256', () => {
    // FIPS 180-2, appendix B.1: SHA-256 of "abc".
    expect(sha256('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
    expect(chainHash('a', 'b', sha256)).toBe(sha256('a\nb'));
    const [first] = three();
    expect(first!.previousHash).toBe(chainStart);
    expect(first!.hash).toBe(sha256(`${chainStart}\n{"author":{"id":"u","name":"Ada Fern"},"content":{"amount":1},"reason":"","recordId":"a","sequence":1,"signedAt":"2026-05-12T13:00:00.000Z","version":1}`));
  });

  it('survives storage as JSON in any order of keys', () => {
    const stored = three().map((entry) => JSON.parse(JSON.stringify(Object.fromEntries(Object.entries(entry).reverse()))) as ChainEntry<Content>);
    expect(verifyChain(stored, sha256).isWhole).toBe(true);
  });

  it.each([
    ['a changed amount', (e: ChainEntry<Content>[]) => [e[0]!, { ...e[1]!, content: { amount: 9 } }, e[2]!], 2, 'hash'],
    ['a changed author', (e: ChainEntry<Content>[]) => [{ ...e[0]!, author: { id: 'v', name: 'Bo' } }, e[1]!, e[2]!], 1, 'hash'],
    ['a changed time', (e: ChainEntry<Content>[]) => [e[0]!, e[1]!, { ...e[2]!, signedAt: '2026-05-12T14:00:00.000Z' }], 3, 'hash'],
    ['a dropped entry', (e: ChainEntry<Content>[]) => [e[0]!, e[2]!], 2, 'sequence'],
    ['a dropped entry with the numbers closed up', (e: ChainEntry<Content>[]) => [e[0]!, { ...e[2]!, sequence: 2 }], 2, 'previousHash'],
    ['two entries changed about', (e: ChainEntry<Content>[]) => [e[1]!, e[0]!, e[2]!], 1, 'sequence'],
    ['a version left out', (e: ChainEntry<Content>[]) => [e[0]!, e[1]!, { ...e[2]!, version: 3 }], 3, 'version'],
    ['a correction without its reason', (e: ChainEntry<Content>[]) => [e[0]!, e[1]!, { ...e[2]!, reason: '' }], 3, 'reason'],
  ])('shows %s', (_, tamper, sequence, kind) => {
    expect(verifyChain(tamper(three()), sha256)).toMatchObject({ isWhole: false, fault: { sequence, kind } });
  });

  it('shows an end cut off, and a chain made anew, by a head noted elsewhere', () => {
    const entries = three();
    expect(verifyChain(entries.slice(0, 2), sha256)).toMatchObject({ isWhole: true });
    expect(verifyChain(entries.slice(0, 2), sha256, entries[2]!.hash)).toMatchObject({ isWhole: false, fault: { kind: 'head' } });
    expect(verifyChain(entries, sha256, entries[1]!.hash)).toMatchObject({ isWhole: true });
    expect(verifyChain(chainOf([{ recordId: 'a', amount: 7, reason: '' }]), sha256, entries[0]!.hash).isWhole).toBe(false);
  });

  it('shows any single changed amount in any chain', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ recordId: fc.constantFrom('a', 'b', 'c'), amount: fc.integer() }), { minLength: 1, maxLength: 8 }), fc.nat(), (steps, pick) => {
        const seen = new Set<string>();
        const entries = chainOf(steps.map((step) => ({ ...step, reason: seen.has(step.recordId) ? 'corrected' : (seen.add(step.recordId), '') })));
        expect(verifyChain(entries, sha256).isWhole).toBe(true);
        const at = pick % entries.length;
        const changed = entries.map((entry, index) => (index === at ? { ...entry, content: { amount: entry.content.amount + 1 } } : entry));
        expect(verifyChain(changed, sha256)).toMatchObject({ isWhole: false, fault: { sequence: at + 1, kind: 'hash' } });
      }),
      { numRuns: 60 },
    );
  });

  it('takes no correction without a reason, no reason without a correction, and no time before the last', () => {
    const [first] = three();
    const signed = { recordId: 'a', content: { amount: 1 }, author, signedAt: '2026-05-12T15:00:00.000Z' };
    expect(() => nextEntry(first!, 1, { ...signed, reason: ' ' }, sha256)).toThrow(/reason must say why/);
    expect(() => nextEntry(first!, 0, { ...signed, reason: 'x' }, sha256)).toThrow(/reason must be empty/);
    expect(() => nextEntry(first!, 1, { ...signed, reason: 'x', signedAt: '2026-05-12T12:00:00.000Z' }, sha256)).toThrow(/signedAt/);
  });
});

describe('canonical JSON', () => {
  it('sorts keys as RFC 8785, §3.2.3 shows', () => {
    const sorted = canonicalJson({ '\u20ac': 'Euro Sign', '\r': 'Carriage Return', '\ufb33': 'Hebrew Letter Dalet With Dagesh', '1': 'One', '\ud83d\ude00': 'Emoji: Grinning Face', '\u0080': 'Control', '\u00f6': 'Latin Small Letter O With Diaeresis' });
    expect([...sorted.matchAll(/:"([^"]+)"/g)].map(([, value]) => value)).toEqual(['Carriage Return', 'One', 'Control', 'Latin Small Letter O With Diaeresis', 'Euro Sign', 'Emoji: Grinning Face', 'Hebrew Letter Dalet With Dagesh']);
  });

  it('refuses what is no JSON', () => {
    expect(() => canonicalJson({ rate: NaN })).toThrow(/NaN/);
    expect(() => canonicalJson(undefined)).toThrow(/Only JSON/);
  });
});

describe('a CSV export (RFC 4180, §2)', () => {
  it('has CRLF lines, and quotes what holds a comma, a quote or a line break', () => {
    expect(csvText(['a', 'b'], [['x,y', 'say "go"'], ['one\ntwo', 'plain']])).toBe('a,b\r\n"x,y","say ""go"""\r\n"one\ntwo",plain\r\n');
  });

  it('runs no formula: text is led by an apostrophe, numbers stay numbers', () => {
    expect(csvText(['v'], [['=1+1'], ['@cmd'], ['-2'], [-2], ['\t=1'], ['＝1'], [null], [true], ['+1,5']])).toBe("v\r\n'=1+1\r\n'@cmd\r\n'-2\r\n-2\r\n'\t=1\r\n'＝1\r\n\r\nyes\r\n\"'+1,5\"\r\n");
  });

  it('refuses a row that does not fit its head', () => {
    expect(() => csvText(['a', 'b'], [['x']])).toThrow(/Row 1 has 1 fields/);
  });
});

describe('impossible records', () => {
  const record = { date: '2026-05-12', startedAt: null, stoppedAt: null, areaHa: 1, sprayVolumeL: 90, bbch: null, windMs: null, windFromDeg: null, temperatureC: null, products: [{ amount: 1, amountUnit: 'L', rate: 1 }] } as unknown as ApplicationRecord;
  const paths = (own: Partial<ApplicationRecord>) => recordProblems({ ...record, ...own }, '2026-05-13').map(({ path, message }) => `${path} ${message}`);

  it('are named: a stop before the start, two days in one, a day to come, a rate without an area, an amount without a unit', () => {
    expect(paths({})).toEqual([]);
    expect(paths({ startedAt: '2026-05-12T13:00:00Z', stoppedAt: '2026-05-12T12:00:00Z' })).toEqual(['stoppedAt must not be before the start']);
    expect(paths({ startedAt: '2026-05-12T13:00:00Z', stoppedAt: '2026-05-14T12:00:00Z' })[0]).toMatch(/stoppedAt must be within a day/);
    expect(paths({ date: '2026-05-14' })).toEqual(['date must not be in the future']);
    expect(paths({ areaHa: null })).toEqual(['areaHa must be entered: a rate needs an area']);
    expect(paths({ products: [{ ...record.products[0]!, amountUnit: null }] })[0]).toMatch(/^products\.0\.amountUnit/);
    expect(paths({ products: [] })).toEqual(['products must name at least one product']);
  });
});

describe('observed weather', () => {
  it('is the reading, else the observation, else the forecast, nearest to the work', () => {
    const values: Observed[] = [
      { value: 1, origin: 'forecast', at: '2026-05-12T13:00:00Z' },
      { value: 2, origin: 'observation', at: '2026-05-12T13:00:00Z' },
      { value: 3, origin: 'reading', at: '2026-05-12T12:30:00Z' },
      { value: 4, origin: 'reading', at: '2026-05-12T13:10:00Z' },
    ];
    expect(bestObserved(values, '2026-05-12T13:00:00Z')!.value).toBe(4);
    expect(bestObserved(values.slice(0, 2), '2026-05-12T13:00:00Z')!.origin).toBe('observation');
    expect(bestObserved([], '2026-05-12T13:00:00Z')).toBeNull();
  });
});
