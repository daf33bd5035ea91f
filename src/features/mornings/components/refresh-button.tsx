import { Button, useToast } from '../../../components/index.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { useRefreshForecast } from '../../daybreak/api/refresh-forecast.ts';

export function RefreshButton() {
  const { id: farmId } = useFarm();
  const toast = useToast();
  const refresh = useRefreshForecast(farmId);
  return (
    <Button variant="quiet" busy={refresh.isPending} onClick={() => refresh.mutate(undefined, { onSuccess: () => toast('This is the newest there is.'), onError: (error) => toast(error.message) })}>
      Fetch the forecast
    </Button>
  );
}
