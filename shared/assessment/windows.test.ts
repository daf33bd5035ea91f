import { describe, expect, it } from 'vitest';
import { betterFit, fitInto } from './windows.ts';

const room = (values: number[]) => Float64Array.from(values);
const none = (count: number) => new Uint8Array(count);
const run = (to: number) => ({ from: 0, to });

describe('the start that a notice names', () => {
  it('is the earliest with room enough, not the roomiest of the morning', () => {
    expect(fitInto(run(6), room([0.02, 0.2, 0.3, 0.9, 1, 1]), none(6), 10)!.bestStartMin).toBe(5);
  });

  it('has the most room there is when none has room enough', () => {
    expect(fitInto(run(5), room([0.01, 0.05, 0.1, 0.1, 0.02]), none(5), 10)!.bestStartMin).toBe(10);
  });

  it('keeps clear of the hours when bees are out, even where they only advise', () => {
    const bees = Uint8Array.from([0, 0, 0, 1, 1, 1]);
    expect(fitInto(run(6), room([0.2, 0.2, 0.3, 0.9, 1, 1]), bees, 15)).toMatchObject({ bestStartMin: 0, stepsAgainstAdvice: 0 });
    expect(fitInto(run(6), room([0.2, 0.2, 0.3, 0.9, 1, 1]), bees, 20)).toMatchObject({ bestStartMin: 0, stepsAgainstAdvice: 1 });
  });

  it('does not exist in a window shorter than job and reserve', () => {
    expect(fitInto(run(3), room([1, 1, 1]), none(3), 16)).toBeNull();
  });

  it('is taken from the earlier of two windows that are as good', () => {
    const early = fitInto({ from: 0, to: 3 }, room([0.2, 0.2, 0.2, 0, 1, 1, 1]), none(7), 10);
    const late = fitInto({ from: 4, to: 7 }, room([0.2, 0.2, 0.2, 0, 1, 1, 1]), none(7), 10);
    expect(betterFit(early, late)!.bestStartMin).toBe(0);
  });
});
