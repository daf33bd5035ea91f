import { useSuspenseQuery } from '@tanstack/react-query';
import type { Device } from '../../../../shared/api/notices.ts';
import { Button, EmptyState, useToast } from '../../../components/index.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { devicesQuery, useRemoveDevice, useTestDevice } from '../api/devices.ts';

/** My phones and browsers, each with what is known to have arrived there. */
export function DeviceList() {
  const { id: farmId } = useFarm();
  const { data: devices } = useSuspenseQuery(devicesQuery(farmId));
  if (devices.length === 0) return <EmptyState>No device of yours gets a push yet. Open this page on your phone and enable it.</EmptyState>;
  return (
    <ul className="divide-y divide-ink/10">
      {devices.map((device) => (
        <DeviceRow key={device.id} device={device} />
      ))}
    </ul>
  );
}

function DeviceRow({ device }: { device: Device }) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const toast = useToast();
  const test = useTestDevice(farmId);
  const remove = useRemoveDevice(farmId);
  const say = (done: string) => ({ onSuccess: () => toast(done), onError: (error: Error) => toast(error.message) });
  const last = device.lastShownAt ? `Last shown ${dateTime(device.lastShownAt, reader)}` : device.lastAcceptedAt ? `Last accepted ${dateTime(device.lastAcceptedAt, reader)}, not known to be shown` : 'Nothing sent yet';
  return (
    <li className="flex flex-wrap items-center justify-between gap-3 py-3">
      <span>
        <span className="block font-semibold">{device.name}</span>
        <span className="block text-sm text-ink-soft">
          {last} · through {device.pushService}
        </span>
      </span>
      <span className="flex gap-2">
        <Button variant="quiet" busy={test.isPending} onClick={() => test.mutate(device.id, say('A test notice is on its way.'))}>
          Send a test
        </Button>
        <Button variant="quiet" busy={remove.isPending} onClick={() => remove.mutate(device.id, say(`${device.name} gets no more push.`))}>
          Remove
        </Button>
      </span>
    </li>
  );
}
