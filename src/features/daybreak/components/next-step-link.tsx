import { Button, ButtonLink, useToast } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';
import { useRefreshForecast } from '../api/refresh-forecast.ts';
import type { NextStep } from '../next-step.ts';

/** The one thing to press. */
export function NextStepLink({ farmId, step }: { farmId: string; step: NextStep }) {
  const refresh = useRefreshForecast(farmId);
  const toast = useToast();
  const { does } = step;
  if (does.kind === 'refresh') {
    return (
      <Button busy={refresh.isPending} onClick={() => refresh.mutate(undefined, { onError: (error) => toast(error.message) })}>
        {does.label}
      </Button>
    );
  }
  return (
    <ButtonLink variant="primary" to={does.kind === 'plan' ? paths.plans.create(farmId) : paths.morning(farmId, does.date)}>
      {does.label}
    </ButtonLink>
  );
}
