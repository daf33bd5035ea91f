import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, statementsDuring, type TestApp } from '../support/app.ts';
import { buildFarm, buildUser, lettersTo, password, signInAs, tokenIn } from '../support/people.ts';

let app: TestApp;
beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true } });
});
afterAll(() => app.close());

const signUp = (email: string) => app.browser().post('/api/account/sign-up').send({ name: 'Ada Row', email, password });

describe('opening an account', () => {
  it('sends a letter whose link confirms the address, once', async () => {
    await signUp('ada@example.org').expect(202);
    const [letter] = await lettersTo(app, 'ada@example.org');
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: 'ada@example.org', password }).expect(200);
    expect((await browser.get('/api/account')).body.emailConfirmed).toBe(false);
    const token = tokenIn(letter!.link);
    await browser.post('/api/account/confirm').send({ token }).expect(204);
    expect((await browser.get('/api/account')).body.emailConfirmed).toBe(true);
    const again = await browser.post('/api/account/confirm').send({ token }).expect(410);
    expect(again.body.detail).toMatch(/used already or is too old/);
  });

  it('answers a known address just as a new one, and tells its owner by letter', async () => {
    const known = await buildUser(app, 'Known Person');
    const answer = await signUp(known.email).expect(202);
    const fresh = await signUp('somebody-new@example.org').expect(202);
    expect(answer.text).toBe(fresh.text);
    expect((await lettersTo(app, known.email))[0]!.subject).toMatch(/have an account/);
  });

  it('asked for twice at one moment makes one account, and answers both alike', async () => {
    const answers = await Promise.all([signUp('twin@example.org'), signUp('twin@example.org')]);
    expect(answers.map((answer) => answer.status)).toEqual([202, 202]);
    expect(await app.services.models.users.count({ where: { email: 'twin@example.org' } })).toBe(1);
  });

  it('sends the letter again on request; the earlier link is good no more', async () => {
    await signUp('again@example.org').expect(202);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: 'again@example.org', password }).expect(200);
    await browser.post('/api/account/confirm-request').expect(202);
    const tokens = (await lettersTo(app, 'again@example.org')).map((letter) => tokenIn(letter.link));
    expect(tokens).toHaveLength(2);
    const statuses = [];
    for (const token of tokens) statuses.push((await browser.post('/api/account/confirm').send({ token })).status);
    expect(statuses.sort()).toEqual([204, 410]);
    expect((await browser.get('/api/account')).body.emailConfirmed).toBe(true);
    await browser.post('/api/account/confirm-request').expect(202);
    expect(await lettersTo(app, 'again@example.org')).toHaveLength(2);
  });

  it('keeps only a hash of the token it sends', async () => {
    await signUp('hidden@example.org').expect(202);
    const [letter] = await lettersTo(app, 'hidden@example.org');
    const kept = (await app.services.models.oneTimeTokens.findAll()).map((row) => row.tokenHash);
    expect(kept).not.toContain(tokenIn(letter!.link));
  });

  it('names every entry that needs another look, and keeps none of them', async () => {
    const answer = await app.browser().post('/api/account/sign-up').send({ name: ' ', email: 'no address', password: 'short' }).expect(422);
    expect(answer.headers['content-type']).toMatch(/application\/problem\+json/);
    expect(answer.body.problems.map((problem: { path: string }) => problem.path).sort()).toEqual(['email', 'name', 'password']);
  });
});

describe('signing in', () => {
  it('gives an HttpOnly same-site cookie and keeps only a hash of the session', async () => {
    const user = await buildUser(app);
    const answer = await app.browser().post('/api/account/sign-in').send({ email: user.email.toUpperCase(), password }).expect(200);
    const cookie = answer.headers['set-cookie']![0]!;
    expect(cookie).toMatch(/HttpOnly/);
    expect(cookie).toMatch(/SameSite=Lax/);
    const id = /dawnvane_session=([^;]+)/.exec(cookie)![1]!;
    const stored = (await app.services.models.sessions.findAll({ where: { userId: user.id } })).map((row) => row.idHash);
    expect(stored).toHaveLength(1);
    expect(stored[0]).not.toContain(id);
  });

  it('answers an unknown address and a wrong password alike', async () => {
    const user = await buildUser(app);
    const wrong = await app.browser().post('/api/account/sign-in').send({ email: user.email, password: 'not this one' }).expect(401);
    const unknown = await app.browser().post('/api/account/sign-in').send({ email: 'nobody@example.org', password }).expect(401);
    expect(unknown.body).toEqual(wrong.body);
  });

  it('refuses a request from another site', async () => {
    const user = await buildUser(app);
    await app.browser().post('/api/account/sign-in').set('Origin', 'https://elsewhere.example').send({ email: user.email, password }).expect(403);
  });

  it('lasts while it is used: a session in its second half is renewed, and so is its cookie', async () => {
    const browser = await signInAs(app, await buildFarm(app), 'crew');
    const inDays = async (days: number) => app.services.sequelize.query(`UPDATE sessions SET expires_at = UTC_TIMESTAMP(3) + INTERVAL ${days} DAY WHERE user_id = '${browser.userId}'`);
    expect((await browser.get('/api/account').expect(200)).headers['set-cookie']).toBeUndefined();
    await inDays(3);
    expect((await browser.get('/api/account').expect(200)).headers['set-cookie']![0]).toMatch(/^dawnvane_session=[^;]+;/);
    await inDays(-1);
    await browser.get('/api/account').expect(401);
  });

  it('clears away sessions that have run out', async () => {
    const { models, sequelize } = app.services;
    const user = await buildUser(app);
    await app.browser().post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    await sequelize.query(`UPDATE sessions SET expires_at = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND WHERE user_id = '${user.id}'`);
    await app.browser().post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    expect(await models.sessions.count({ where: { userId: user.id } })).toBe(1);
  });

  it('is told apart, with the rights at every farm, by one question to the database', async () => {
    const farmId = await buildFarm(app);
    const browser = await signInAs(app, farmId, 'observer');
    const asked = await statementsDuring(app, async () => void (await browser.get(`/api/farms/${farmId}/daybreak`).expect(200)));
    // The resting assessor of this test asks nothing.
    expect(asked).toHaveLength(1);
  });

  it('ends with signing out', async () => {
    const browser = await signInAs(app, await buildFarm(app), 'crew');
    await browser.post('/api/account/sign-out').expect(204);
    await browser.get('/api/account').expect(401);
  });
});

describe('a new password', () => {
  it('by letter: works once, and signs out everywhere', async () => {
    const browser = await signInAs(app, await buildFarm(app), 'owner');
    await browser.post('/api/account/reset-request').send({ email: browser.email }).expect(202);
    const token = tokenIn((await lettersTo(app, browser.email))[0]!.link);
    await app.browser().post('/api/account/reset').send({ token, password: 'another long password' }).expect(204);
    await browser.get('/api/account').expect(401);
    await app.browser().post('/api/account/reset').send({ token, password: 'yet another password' }).expect(410);
    await app.browser().post('/api/account/sign-in').send({ email: browser.email, password: 'another long password' }).expect(200);
  });

  it('by letter: ends every other letter that is still open', async () => {
    const user = await buildUser(app);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    await browser.post('/api/account/reset-request').send({ email: user.email }).expect(202);
    await browser.post('/api/account/password').send({ currentPassword: password, newPassword: 'another long password' }).expect(204);
    const token = tokenIn((await lettersTo(app, user.email)).find((letter) => letter.subject.startsWith('Set a new'))!.link);
    await app.browser().post('/api/account/reset').send({ token, password: 'yet another password' }).expect(410);
  });

  it('by letter: is refused after two hours', async () => {
    const user = await buildUser(app);
    await app.browser().post('/api/account/reset-request').send({ email: user.email }).expect(202);
    const token = tokenIn((await lettersTo(app, user.email))[0]!.link);
    const now = app.clock.now();
    app.clock.set(new Date(now.getTime() + 2 * 3_600_000 + 1));
    await app.browser().post('/api/account/reset').send({ token, password: 'another long password' }).expect(410);
    app.clock.set(now);
  });

  it('asked for an unknown address: the same answer, and no letter', async () => {
    await app.browser().post('/api/account/reset-request').send({ email: 'ghost@example.org' }).expect(202);
    expect(await lettersTo(app, 'ghost@example.org')).toEqual([]);
  });

  it('changed by its owner: stays signed in here, is signed out elsewhere, and a letter tells', async () => {
    const here = await signInAs(app, await buildFarm(app), 'owner');
    const elsewhere = app.browser();
    await elsewhere.post('/api/account/sign-in').send({ email: here.email, password }).expect(200);
    const wrong = await here.post('/api/account/password').send({ currentPassword: 'not this', newPassword: 'another long password' }).expect(422);
    expect(wrong.body.problems[0].path).toBe('currentPassword');
    await here.post('/api/account/password').send({ currentPassword: password, newPassword: 'another long password' }).expect(204);
    await here.get('/api/account').expect(200);
    await elsewhere.get('/api/account').expect(401);
    expect((await lettersTo(app, here.email)).map((letter) => letter.subject)).toEqual(['Your Dawnvane password was changed']);
  });
});

describe('guessing', () => {
  let strict: TestApp;
  beforeAll(async () => {
    strict = await createTestApp();
  });
  afterAll(() => strict.close());
  const guess = (email: string, from: string) => strict.browser().post('/api/account/sign-in').set('X-Forwarded-For', from).send({ email, password: 'y' });

  it('from one network is slowed down: after ten tries it waits, and is told how long', async () => {
    const tries = [];
    for (let index = 0; index < 11; index += 1) tries.push(await guess(`x${index}@example.org`, '192.0.2.1'));
    expect(tries.slice(0, 10).map((answer) => answer.status)).toEqual(Array(10).fill(401));
    expect(tries[10]!.status).toBe(429);
    expect(Number(tries[10]!.headers['retry-after'])).toBeGreaterThan(0);
    expect(tries[10]!.headers['content-type']).toMatch(/application\/problem\+json/);
  });

  it('one address from many networks is slowed down too', async () => {
    const statuses = [];
    for (let index = 0; index < 31; index += 1) statuses.push((await guess('wanted@example.org', `198.51.100.${index}`)).status);
    expect(statuses.slice(0, 30)).toEqual(Array(30).fill(401));
    expect(statuses[30]).toBe(429);
  });

  it('letters to one address are not sent without end', async () => {
    const statuses = [];
    for (let index = 0; index < 6; index += 1) statuses.push((await strict.browser().post('/api/account/reset-request').set('X-Forwarded-For', '203.0.113.9').send({ email: 'flood@example.org' })).status);
    expect(statuses).toEqual([202, 202, 202, 202, 202, 429]);
  });
});
