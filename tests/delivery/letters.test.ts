import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { inTransaction } from '../../server/database/connection.ts';
import { queueLetter, type Letter } from '../../server/delivery/letters.ts';
import { maskedAddress } from '../../server/delivery/mask.ts';
import { seal, unseal } from '../../server/delivery/seal.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

describe('letters outside notices', () => {
  let app: AlertApp;
  let letter: Letter;
  let count = 0;
  beforeAll(async () => {
    app = await createAlertApp();
  });
  beforeEach(async () => {
    await app.reopen();
    count += 1;
    letter = { to: 'new.person@example.org', subject: 'Grüße\r\nBcc: all@example.org', text: 'Token 12345', html: '<p>Token 12345</p>', key: `confirm:${count}`, usefulUntil: new Date(app.clock.now().getTime() + 3_600_000) };
  });
  afterAll(() => app.close());
  const queue = (which = letter) => inTransaction(app.services.sequelize, (transaction) => queueLetter(app.services, transaction, which));
  const row = () => app.services.models.deliveries.findOne({ where: { deliveryKey: `letter:${letter.key}` } });

  it('go out, and their text is gone from the database afterwards', async () => {
    await queue();
    expect(JSON.stringify((await row())!.payload)).toContain('12345');
    await app.parts.worker.drain();
    const [mail] = app.fakes.mail.mails();
    expect(mail).toMatchObject({ to: 'new.person@example.org', text: expect.stringContaining('Token 12345') as string });
    expect(mail!.headers['auto-submitted']).toBe('auto-generated');
    const kept = await row();
    expect(kept).toMatchObject({ state: 'delivered', recipient: 'n…n@example.org' });
    expect(JSON.stringify(kept!.payload)).toBe('{}');
  });

  it('put no header in by their subject', async () => {
    await queue();
    await app.parts.worker.drain();
    expect(app.fakes.mail.mails()[0]!.subject).toBe('Grüße Bcc: all@example.org');
    expect(Object.keys(app.fakes.mail.mails()[0]!.headers)).not.toContain('bcc');
  });

  it('of one key go out once', async () => {
    expect(await queue()).toBe(true);
    expect(await queue()).toBe(false);
    await app.parts.worker.drain();
    expect(await queue()).toBe(false);
    await app.parts.worker.drain();
    expect(app.fakes.mail.mails()).toHaveLength(1);
  });

  it('do not go out when the transaction that wrote them fails', async () => {
    await expect(
      inTransaction(app.services.sequelize, async (transaction) => {
        await queueLetter(app.services, transaction, letter);
        throw new Error('no account after all');
      }),
    ).rejects.toThrow();
    await app.parts.worker.drain();
    expect(app.fakes.mail.mails()).toEqual([]);
  });

  it('are dropped, text and all, when they come too late to be of use', async () => {
    await queue();
    app.clock.set(letter.usefulUntil);
    await app.parts.worker.drain();
    expect(app.fakes.mail.mails()).toEqual([]);
    expect(JSON.stringify((await row())!.payload)).toBe('{}');
  });

  it('are seen at once by a running worker of the same process', async () => {
    app.parts.worker.start();
    expect(await app.parts.worker.status()).toMatchObject({ state: 'ok' });
    await queue();
    await expect.poll(() => app.fakes.mail.mails().length, { timeout: 5000 }).toBe(1);
  });
});

describe('sealed secrets', () => {
  const secret = Buffer.alloc(32, 1);
  it('open under the same secret and purpose only', () => {
    const sealed = seal(secret, 'webhook', 'whsec_ß');
    expect(unseal(secret, 'webhook', sealed)).toBe('whsec_ß');
    expect(() => unseal(secret, 'vapid', sealed)).toThrow();
    expect(() => unseal(Buffer.alloc(32, 2), 'webhook', sealed)).toThrow(/secret was changed/);
    expect(() => unseal(secret, 'webhook', `${sealed.slice(0, -2)}AA`)).toThrow();
    expect(() => unseal(secret, 'webhook', 'v1.')).toThrow();
  });

  it('look different each time', () => {
    expect(seal(secret, 'webhook', 'same')).not.toBe(seal(secret, 'webhook', 'same'));
  });
});

describe('addresses shown in logs', () => {
  it.each([
    ['marit@example.org', 'm…t@example.org'],
    ['bob@example.org', 'b…@example.org'],
    ['a@b@example.org', 'a…@example.org'],
    ['nonsense', '…'],
  ])('hide the middle of %s', (address, masked) => {
    expect(maskedAddress(address)).toBe(masked);
  });
});
