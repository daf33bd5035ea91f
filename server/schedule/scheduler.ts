/** Does what is due: eve and dawn notices, forecast refresh, messages that came in. Any number may run on one database. */
export interface Scheduler {
  start(): void;
  /** Ends after the work under way. */
  stop(): Promise<void>;
  /** Does everything due until the clock's present instant, messages that came in included. */
  tick(): Promise<void>;
  /** The earliest moment at which something falls due; null when no farm is scheduled. */
  nextDueAt(): Promise<Date | null>;
  /** Says that a message came in, so that it is taken at once. */
  nudge(): void;
}
