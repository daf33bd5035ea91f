import type { AppSettings } from '../../server/services.ts';

/** The same in every process of a fault run. The secret is no secret: it seals keys of a throw-away database. */
export const faultSettings: AppSettings = {
  publicUrl: 'http://dawnvane.test', production: false, demo: false, version: '0.0.0-test', secret: Buffer.alloc(32, 9), mailFrom: 'Dawnvane <notices@dawnvane.example>', contact: 'mailto:keeper@dawnvane.example',
  permittedHosts: ['127.0.0.1'], clientFolder: null, uploadsFolder: '/nonexistent',
};
