import type { DemoClock } from '../../../../shared/api/system.ts';
import { useToast } from '../../../components/index.ts';
import { useSetDemoClock } from '../api/demo.ts';
import { stepWords } from '../steps.ts';

/** Small buttons to step the demo clock on. */
export function StepButtons({ clock, only }: { clock: DemoClock; only: number }) {
  const set = useSetDemoClock();
  const toast = useToast();
  return clock.next.slice(0, only).map(({ name, at }) => (
    <button
      key={name}
      type="button"
      disabled={set.isPending}
      aria-busy={set.isPending}
      className="min-h-9 rounded-full bg-[#f0b95b] px-3 font-semibold whitespace-nowrap text-[#1e2440] disabled:opacity-60"
      onClick={() => set.mutate(at, { onError: (error) => toast(error.message) })}
    >
      <span className="sr-only md:not-sr-only">Step </span>to {stepWords[name].short}
    </button>
  ));
}
