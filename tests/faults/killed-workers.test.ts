import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';
import { killWorkers } from './killed-workers.ts';

describe('workers killed while they send', () => {
  let database: TestDatabase;
  beforeAll(async () => {
    database = await createTestDatabase();
  });
  afterAll(() => database.drop());

  it('lose nothing, and what comes again replaces itself on the device', async () => {
    const report = await killWorkers(database.url, { notices: 150, kills: 5, seed: 20261201 });
    expect(report).toMatchObject({ queued: 150, kills: 5, sent: 150, lost: 0, shownTwice: 0, unsettled: 0 });
  }, 120_000);
});
