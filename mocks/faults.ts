import { HttpResponse } from 'msw';

/** How a far end fails once: an answer of its own, or a broken connection. */
export type Fault = { status: number; headers?: Record<string, string>; body?: string } | { broken: true };

/** Faults that a far end will answer with, one for each call, before it answers well again. */
export class FaultQueue {
  #faults: Fault[] = [];
  #afterMs = 0;

  /** @param times how many calls it answers */
  add(fault: Fault, times = 1): void {
    for (let time = 0; time < times; time += 1) this.#faults.push(fault);
  }

  clear(): void {
    this.#faults = [];
    this.#afterMs = 0;
  }

  /** Every answer comes this much later, until set to 0 again. */
  slow(ms: number): void {
    this.#afterMs = ms;
  }

  async next(): Promise<Response | null> {
    const fault = this.#faults.shift();
    if (this.#afterMs > 0) await new Promise((resolve) => setTimeout(resolve, this.#afterMs));
    if (!fault) return null;
    return 'broken' in fault ? HttpResponse.error() : new HttpResponse(fault.body ?? null, { status: fault.status, headers: fault.headers ?? {} });
  }
}
