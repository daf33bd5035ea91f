import type { StationReading } from '../../../shared/api/mornings.ts';

export const hangTestWords: Record<NonNullable<StationReading['hangTest']>, string> = {
  mixed: 'It rose and mixed',
  hung: 'It hung in a layer',
  blew: 'It blew away',
};
