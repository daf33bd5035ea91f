import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';
import type { AssessOptions } from '../verdicts/assessor.ts';

/** Judges a farm's mornings anew after a change that verdicts draw on. */
export type Reassess = (farmId: string) => Promise<void>;

/**
 * The change itself is committed: when the assessment fails, that is logged and the next one makes good, and the person
 * is not told that their change failed.
 */
export const reassessAfterChange =
  ({ log }: Services, { assessor }: Pick<Parts, 'assessor'>, fetch: AssessOptions['fetch'] = 'never'): Reassess =>
  async (farmId) => {
    try {
      await assessor.assessFarm(farmId, { fetch });
    } catch (error) {
      log.error({ err: error, farmId }, 'a change is stored, but the farm could not be assessed after it');
    }
  };
