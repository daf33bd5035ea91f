import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../support/app.ts';
import { buildFarm, buildUser, lettersTo, password, signInAs, tokenIn } from '../support/people.ts';

let app: TestApp;
let count = 0;
beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true } });
});
afterAll(() => app.close());

async function invite(role = 'crew', email = 'mixer@example.org') {
  const name = `Orchard ${(count += 1)}.`;
  const farmId = await buildFarm(app, name);
  const owner = await signInAs(app, farmId, 'owner');
  const answer = await owner.post(`/api/farms/${farmId}/invitations`).send({ email, role }).expect(201);
  return { farmId, owner, invitation: answer.body, token: tokenIn((await lettersTo(app, email)).find((letter) => letter.text.includes(name))!.link) };
}

describe('an invitation', () => {
  it('reaches the invited by letter, and joins them with the role', async () => {
    const user = await buildUser(app, 'Invited Mixer');
    const { farmId, owner, token } = await invite('crew', user.email);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    const me = await browser.post('/api/account/invitations/accept').send({ token }).expect(200);
    expect(me.body.farms).toMatchObject([{ id: farmId, role: 'crew' }]);
    const people = await owner.get(`/api/farms/${farmId}/people`).expect(200);
    expect(people.body.members.map((member: { role: string }) => member.role).sort()).toEqual(['crew', 'owner']);
    expect(people.body.invitations).toEqual([]);
    await browser.post('/api/account/invitations/accept').send({ token }).expect(410);
  });

  it('is refused to another address than the invited one', async () => {
    const { token } = await invite();
    const other = await signInAs(app, await buildFarm(app), 'owner');
    await other.post('/api/account/invitations/accept').send({ token }).expect(403);
  });

  it('goes out only in the name of a person whose own address is confirmed', async () => {
    const farmId = await buildFarm(app);
    const owner = await signInAs(app, farmId, 'owner');
    await app.services.models.users.update({ emailConfirmedAt: null }, { where: { id: owner.userId } });
    const answer = await owner.post(`/api/farms/${farmId}/invitations`).send({ email: 'someone@example.org', role: 'crew' }).expect(403);
    expect(answer.body.detail).toMatch(/Confirm your own e-mail address first/);
  });

  it('sent anew replaces the one before', async () => {
    const user = await buildUser(app, 'Twice Invited');
    const { farmId, owner, token } = await invite('crew', user.email);
    await owner.post(`/api/farms/${farmId}/invitations`).send({ email: user.email, role: 'applicator' }).expect(201);
    expect((await owner.get(`/api/farms/${farmId}/people`)).body.invitations).toMatchObject([{ email: user.email, role: 'applicator' }]);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    await browser.post('/api/account/invitations/accept').send({ token }).expect(410);
  });

  it('confirms the address it reached', async () => {
    const user = await buildUser(app, 'Fresh Face');
    await app.services.models.users.update({ emailConfirmedAt: null }, { where: { id: user.id } });
    const { token } = await invite('observer', user.email);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    expect((await browser.post('/api/account/invitations/accept').send({ token }).expect(200)).body.emailConfirmed).toBe(true);
  });

  it('is refused after two weeks', async () => {
    const user = await buildUser(app, 'Slow Reader');
    const { token } = await invite('crew', user.email);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    const now = app.clock.now();
    app.clock.set(new Date(now.getTime() + 14 * 86_400_000 + 1));
    await browser.post('/api/account/invitations/accept').send({ token }).expect(410);
    app.clock.set(now);
  });

  it('to a member is refused beside the address', async () => {
    const farmId = await buildFarm(app);
    const owner = await signInAs(app, farmId, 'owner');
    const crew = await signInAs(app, farmId, 'crew');
    const answer = await owner.post(`/api/farms/${farmId}/invitations`).send({ email: crew.email, role: 'crew' }).expect(422);
    expect(answer.body.problems).toEqual([{ path: 'email', message: 'belongs to a member of this farm already' }]);
  });

  it('taken back, opens nothing', async () => {
    const user = await buildUser(app, 'Late Comer');
    const { farmId, owner, invitation, token } = await invite('crew', user.email);
    await owner.delete(`/api/farms/${farmId}/invitations/${invitation.id}`).expect(204);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    await browser.post('/api/account/invitations/accept').send({ token }).expect(410);
  });
});

describe('a farm', () => {
  it('keeps its last owner, in role and in membership', async () => {
    const farmId = await buildFarm(app);
    const owner = await signInAs(app, farmId, 'owner');
    const [member] = (await owner.get(`/api/farms/${farmId}/people`)).body.members;
    await owner.put(`/api/farms/${farmId}/people/${member.id}`).send({ role: 'crew' }).expect(422);
    await owner.delete(`/api/farms/${farmId}/people/${member.id}`).expect(422);
  });

  it('keeps an owner even when two owners step down at one moment', async () => {
    const farmId = await buildFarm(app);
    const owner = await signInAs(app, farmId, 'owner');
    await signInAs(app, farmId, 'owner');
    const members: { id: string; role: string }[] = (await owner.get(`/api/farms/${farmId}/people`)).body.members;
    const answers = await Promise.all(members.map((member) => owner.put(`/api/farms/${farmId}/people/${member.id}`).send({ role: 'observer' })));
    expect(answers.map((answer) => answer.status)).toContain(200);
    expect(await app.services.models.memberships.count({ where: { farmId, role: 'owner' } })).toBe(1);
  });

  it('tells its owner who changed what', async () => {
    const farmId = await buildFarm(app);
    const owner = await signInAs(app, farmId, 'owner');
    await signInAs(app, farmId, 'crew');
    const crew = (await owner.get(`/api/farms/${farmId}/people`)).body.members.find((member: { role: string }) => member.role === 'crew');
    await owner.put(`/api/farms/${farmId}/people/${crew.id}`).send({ role: 'applicator' }).expect(200);
    const { items } = (await owner.get(`/api/farms/${farmId}/audit`).expect(200)).body;
    expect(items[0]).toMatchObject({ what: 'role changed', subject: crew.name, details: { before: 'crew', after: 'applicator' } });
  });

  it('forgets the devices of a person who is removed', async () => {
    const farmId = await buildFarm(app);
    const owner = await signInAs(app, farmId, 'owner');
    const crew = await signInAs(app, farmId, 'crew');
    const member = (await owner.get(`/api/farms/${farmId}/people`)).body.members.find((one: { userId: string }) => one.userId === crew.userId);
    await owner.delete(`/api/farms/${farmId}/people/${member.id}`).expect(204);
    await crew.get(`/api/farms/${farmId}`).expect(404);
  });
});
