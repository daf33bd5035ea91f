import type { accountEndpoints } from '../../../shared/api/accounts.ts';
import type { farmEndpoints } from '../../../shared/api/farms.ts';
import type { morningEndpoints } from '../../../shared/api/mornings.ts';
import type { hookEndpoints, noticeEndpoints, webhookEndpoints } from '../../../shared/api/notices.ts';
import type { peopleEndpoints } from '../../../shared/api/people.ts';
import type { planEndpoints, productEndpoints } from '../../../shared/api/plans.ts';
import type { demoEndpoints } from '../../../shared/api/system.ts';
import type { Endpoint } from '../../../shared/api/endpoint.ts';
import { route } from './call.ts';

type Account = typeof accountEndpoints;
type Farm = typeof farmEndpoints;
type Morning = typeof morningEndpoints;
type Notice = typeof noticeEndpoints;
type Hook = typeof hookEndpoints;
type Webhook = typeof webhookEndpoints;
type People = typeof peopleEndpoints;
type Product = typeof productEndpoints;
type Demo = typeof demoEndpoints;

type Kept = { list: Endpoint; read: Endpoint; create: Endpoint; update: Endpoint; archive: Endpoint };

const farm = (rest: string) => `/api/farms/:farmId/${rest}`;

/** The five operations of a thing that a farm keeps. */
const kept = <K extends Kept>(noun: string) => ({
  list: route<K['list']>('get', farm(noun)),
  read: route<K['read']>('get', farm(`${noun}/:id`)),
  create: route<K['create']>('post', farm(noun)),
  update: route<K['update']>('put', farm(`${noun}/:id`)),
  archive: route<K['archive']>('patch', farm(`${noun}/:id/archived`)),
});

/** Every operation that the pages call. */
export const routes = {
  account: {
    signUp: route<Account['signUp']>('post', '/api/account/sign-up'),
    confirmEmail: route<Account['confirmEmail']>('post', '/api/account/confirm'),
    resendConfirmation: route<Account['resendConfirmation']>('post', '/api/account/confirm-request'),
    signIn: route<Account['signIn']>('post', '/api/account/sign-in'),
    signOut: route<Account['signOut']>('post', '/api/account/sign-out'),
    me: route<Account['me']>('get', '/api/account'),
    updateMe: route<Account['updateMe']>('put', '/api/account'),
    changePassword: route<Account['changePassword']>('post', '/api/account/password'),
    requestReset: route<Account['requestReset']>('post', '/api/account/reset-request'),
    resetPassword: route<Account['resetPassword']>('post', '/api/account/reset'),
    acceptInvitation: route<Account['acceptInvitation']>('post', '/api/account/invitations/accept'),
  },
  farm: {
    create: route<Farm['createFarm']>('post', '/api/farms'),
    read: route<Farm['readFarm']>('get', '/api/farms/:farmId'),
    update: route<Farm['updateFarm']>('put', '/api/farms/:farmId'),
    archive: route<Farm['archiveFarm']>('patch', '/api/farms/:farmId/archived'),
  },
  blocks: kept<Farm['blocks']>('blocks'),
  places: kept<Farm['places']>('sensitive-places'),
  sprayers: kept<Farm['sprayers']>('sprayers'),
  products: {
    ...kept<Pick<Product, keyof Kept>>('products'),
    uploadLabel: route<Product['uploadLabel']>('post', farm('products/:id/label')),
    readLabel: route<Product['readLabel']>('get', farm('products/:id/label')),
  },
  plans: kept<typeof planEndpoints>('plans'),
  mornings: {
    daybreak: route<Morning['daybreak']>('get', farm('daybreak')),
    read: route<Morning['readMorning']>('get', farm('mornings/:date')),
    refresh: route<Morning['refresh']>('post', farm('daybreak/refresh')),
    listReadings: route<Morning['listReadings']>('get', farm('readings')),
    createReading: route<Morning['createReading']>('post', farm('readings')),
    deleteReading: route<Morning['deleteReading']>('delete', farm('readings/:id')),
  },
  notices: {
    list: route<Notice['listNotices']>('get', farm('notices')),
    replay: route<Notice['replayDelivery']>('post', farm('deliveries/:id/replay')),
    readWishes: route<Notice['readWishes']>('get', farm('wishes')),
    updateWishes: route<Notice['updateWishes']>('put', farm('wishes')),
    pushKey: route<Notice['pushKey']>('get', '/api/push/key'),
    listDevices: route<Notice['listDevices']>('get', farm('devices')),
    createDevice: route<Notice['createDevice']>('post', farm('devices')),
    deleteDevice: route<Notice['deleteDevice']>('delete', farm('devices/:id')),
    testDevice: route<Notice['testDevice']>('post', farm('devices/:id/test')),
  },
  webhooks: {
    list: route<Webhook['list']>('get', farm('webhooks')),
    create: route<Webhook['create']>('post', farm('webhooks')),
    update: route<Webhook['update']>('put', farm('webhooks/:id')),
    remove: route<Webhook['remove']>('delete', farm('webhooks/:id')),
    test: route<Webhook['test']>('post', farm('webhooks/:id/test')),
  },
  inboundSources: {
    list: route<Hook['listSources']>('get', farm('inbound-sources')),
    create: route<Hook['createSource']>('post', farm('inbound-sources')),
    archive: route<Hook['archiveSource']>('delete', farm('inbound-sources/:id')),
  },
  people: {
    list: route<People['list']>('get', farm('people')),
    invite: route<People['invite']>('post', farm('invitations')),
    revoke: route<People['revoke']>('delete', farm('invitations/:id')),
    changeRole: route<People['changeRole']>('put', farm('people/:id')),
    remove: route<People['remove']>('delete', farm('people/:id')),
    audit: route<People['audit']>('get', farm('audit')),
  },
  demo: {
    status: route<Demo['status']>('get', '/api/demo'),
    readClock: route<Demo['readClock']>('get', '/api/demo/clock'),
    setClock: route<Demo['setClock']>('put', '/api/demo/clock'),
    phone: route<Demo['phone']>('get', '/api/demo/phone'),
    mailbox: route<Demo['mailbox']>('get', '/api/demo/mailbox'),
    hookLog: route<Demo['hookLog']>('get', '/api/demo/hooks'),
    mood: route<Demo['mood']>('put', '/api/demo/mood'),
  },
};
