/** Query keys, from general to particular: what a farm keeps lies under the farm, so that one call forgets it all. */
export const keys = {
  me: () => ['me'] as const,
  pushKey: () => ['pushKey'] as const,
  demoStatus: () => ['demo', 'status'] as const,
  demo: (page: 'clock' | 'phone' | 'mailbox' | 'hooks') => ['demo', page] as const,
  farm: (farmId: string) => ['farms', farmId] as const,
  facts: (farmId: string) => [...keys.farm(farmId), 'facts'] as const,
  mornings: (farmId: string) => [...keys.farm(farmId), 'mornings'] as const,
  daybreak: (farmId: string) => [...keys.mornings(farmId), 'daybreak'] as const,
  morning: (farmId: string, date: string) => [...keys.mornings(farmId), date] as const,
  readings: (farmId: string) => [...keys.farm(farmId), 'readings'] as const,
  kept: (farmId: string, noun: KeptNoun) => [...keys.farm(farmId), noun] as const,
  notices: (farmId: string) => [...keys.farm(farmId), 'notices'] as const,
  wishes: (farmId: string) => [...keys.farm(farmId), 'wishes'] as const,
  devices: (farmId: string) => [...keys.farm(farmId), 'devices'] as const,
  webhooks: (farmId: string) => [...keys.farm(farmId), 'webhooks'] as const,
  inboundSources: (farmId: string) => [...keys.farm(farmId), 'inboundSources'] as const,
  people: (farmId: string) => [...keys.farm(farmId), 'people'] as const,
  audit: (farmId: string) => [...keys.farm(farmId), 'audit'] as const,
};

export type KeptNoun = 'blocks' | 'places' | 'sprayers' | 'products' | 'plans';
