import type { Daybreak, Morning } from '../../shared/api/mornings.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';

/** A forecast handed in by an inbound webhook instead of fetched. */
export interface HandedForecast {
  model: string | null;
  issuedAt: Date | null;
  hours: ForecastHour[];
}

/** The moment on whose account a farm is assessed; `null` for a mere change of data. */
export type Occasion = { kind: 'eve' | 'dawn' | 'summary'; morning: string; dueAt: Date } | null;

export interface AssessOptions {
  /** `now`: ask the provider whatever the cache says; `ifDue`: only when the newest issue is older than its refresh time; `never`: take what is stored. */
  fetch: 'now' | 'ifDue' | 'never';
  occasion?: Occasion;
  handed?: HandedForecast;
}

/** Forecast → assessment → verdict → notice, for one farm, in one transaction; and the pages' view of it. */
export interface Assessor {
  /** Fetches when asked, assesses the coming six mornings, stores changed verdicts and, in the same transaction, the notices they call for. */
  assessFarm(farmId: string, options: AssessOptions): Promise<Daybreak>;
  /** The stored Daybreak as JSON text, assessed now when there is none yet or the day has turned. */
  daybreakJson(farmId: string): Promise<string>;
  /** One morning in full, computed from the newest stored forecast. */
  morning(farmId: string, date: string): Promise<Morning>;
}
