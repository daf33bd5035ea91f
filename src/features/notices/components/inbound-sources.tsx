import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { inboundSourceBody } from '../../../../shared/api/notices.ts';
import { Button, EmptyState, useToast } from '../../../components/index.ts';
import { TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { inboundSourcesQuery, useAddInboundSource, useArchiveInboundSource } from '../api/inbound-sources.ts';
import { SecretShownOnce } from './secret-shown-once.tsx';

/** Senders admitted to `POST /api/hooks/forecast/:source`, each with a secret of its own. */
export function InboundSources() {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const toast = useToast();
  const { data: sources } = useSuspenseQuery(inboundSourcesQuery(farmId));
  const archive = useArchiveInboundSource(farmId);
  const [adding, setAdding] = useState(false);
  const [fresh, setFresh] = useState<{ name: string; secret: string } | null>(null);
  const current = sources.filter(({ archivedAt }) => archivedAt === null);
  return (
    <>
      {current.length === 0 && !adding && <EmptyState>No machine may send yet. Admit your weather station’s hub or a forecast service: what it posts, signed, is judged at once.</EmptyState>}
      <ul className="divide-y divide-ink/10">
        {current.map(({ id, name, lastReceivedAt }) => (
          <li key={id} className="flex flex-wrap items-center justify-between gap-2 py-3">
            <span>
              <span className="block font-semibold">{name}</span>
              <span className="block text-sm break-all">{`${location.origin}/api/hooks/forecast/${id}`}</span>
              <span className="block text-sm text-ink-soft">{lastReceivedAt ? `last heard ${dateTime(lastReceivedAt, reader)}` : 'nothing heard yet'}</span>
            </span>
            <Button variant="quiet" busy={archive.isPending} onClick={() => archive.mutate(id, { onSuccess: () => toast(`${name} may send no longer.`), onError: (error) => toast(error.message) })}>
              Admit no longer
            </Button>
          </li>
        ))}
      </ul>
      {fresh && <SecretShownOnce {...fresh} />}
      {adding ? (
        <SourceForm
          added={(made) => {
            setFresh(made);
            setAdding(false);
          }}
          cancel={() => setAdding(false)}
        />
      ) : (
        <Button variant="quiet" onClick={() => setAdding(true)}>
          Admit a sender
        </Button>
      )}
    </>
  );
}

function SourceForm({ added, cancel }: { added: (made: { name: string; secret: string }) => void; cancel: () => void }) {
  const { id: farmId } = useFarm();
  const add = useAddInboundSource(farmId);
  const form = useTypedForm({ schema: inboundSourceBody, numbers: {}, stored: { name: '' }, save: async (body) => added(await add.mutateAsync(body)) });
  return (
    <RecordForm form={form} cancel={cancel} saveLabel="Admit the sender">
      <Fields>
        <TextField {...form.bind('name')} label="Name" hint="Such as “Weather station at the barn”." required />
      </Fields>
    </RecordForm>
  );
}
