import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { webhookBody, type NoticeKind, type Webhook } from '../../../../shared/api/notices.ts';
import { Button, EmptyState, useToast } from '../../../components/index.ts';
import { CheckGroup, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { useAddWebhook, useChangeWebhook, useRemoveWebhook, useTestWebhook, webhooksQuery } from '../api/webhooks.ts';
import { chosenKinds, noticeKindWords } from '../words.ts';
import { SecretShownOnce } from './secret-shown-once.tsx';

/** Outgoing webhooks, signed by the open Standard Webhooks specification. */
export function Webhooks() {
  const { id: farmId } = useFarm();
  const { data: webhooks } = useSuspenseQuery(webhooksQuery(farmId));
  const [adding, setAdding] = useState(false);
  const [fresh, setFresh] = useState<{ name: string; secret: string } | null>(null);
  return (
    <>
      {webhooks.length === 0 && !adding && <EmptyState>No machine is told yet. A webhook posts each notice, signed, to an address of yours: a gate, a siren, a home server.</EmptyState>}
      <ul className="divide-y divide-ink/10">
        {webhooks.map((webhook) => (
          <WebhookRow key={webhook.id} webhook={webhook} />
        ))}
      </ul>
      {fresh && <SecretShownOnce {...fresh} />}
      {adding ? (
        <WebhookForm
          added={(made) => {
            setFresh(made);
            setAdding(false);
          }}
          cancel={() => setAdding(false)}
        />
      ) : (
        <Button variant="quiet" onClick={() => setAdding(true)}>
          Add a webhook
        </Button>
      )}
    </>
  );
}

interface WebhookFormProps {
  added: (made: { name: string; secret: string }) => void;
  cancel: () => void;
}

function WebhookForm({ added, cancel }: WebhookFormProps) {
  const { id: farmId } = useFarm();
  const add = useAddWebhook(farmId);
  const kinds: NoticeKind[] = ['eve', 'dawn', 'turn'];
  const form = useTypedForm({ schema: webhookBody, numbers: {}, stored: { name: '', url: '', kinds }, save: async (body) => added(await add.mutateAsync(body)) });
  return (
    <RecordForm form={form} cancel={cancel} saveLabel="Add the webhook">
      <Fields>
        <TextField {...form.bind('name')} label="Name" required />
        <TextField {...form.bind('url')} label="Address" type="url" hint="It must begin with https://." required />
        <CheckGroup {...form.bind('kinds')} label="Notices to post" choices={chosenKinds.map((kind) => [kind, noticeKindWords[kind].name])} />
      </Fields>
    </RecordForm>
  );
}

function WebhookRow({ webhook }: { webhook: Webhook }) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const toast = useToast();
  const change = useChangeWebhook(farmId);
  const remove = useRemoveWebhook(farmId);
  const test = useTestWebhook(farmId);
  const say = (done: string) => ({ onSuccess: () => toast(done), onError: (error: Error) => toast(error.message) });
  const { id, name, url, kinds, active } = webhook;
  return (
    <li className="space-y-1 py-3">
      <p className="font-semibold">{name}</p>
      <p className="text-sm break-all">{url}</p>
      <p className="text-sm text-ink-soft">
        {kinds.map((kind) => noticeKindWords[kind].name.toLowerCase()).join(', ')} · {webhook.lastDeliveredAt ? `last delivered ${dateTime(webhook.lastDeliveredAt, reader)}` : 'nothing delivered yet'}
      </p>
      {!active && <p>Switched off{webhook.disabledBecause ? `: ${webhook.disabledBecause}` : '.'}</p>}
      <div className="flex flex-wrap gap-2">
        {active && (
          <Button variant="quiet" busy={test.isPending} onClick={() => test.mutate(id, say('A test event is on its way.'))}>
            Send a test
          </Button>
        )}
        <Button variant="quiet" busy={change.isPending} onClick={() => change.mutate({ id, name, url, kinds, active: !active }, say(active ? `${name} is switched off.` : `${name} is switched on.`))}>
          {active ? 'Switch off' : 'Switch on'}
        </Button>
        <Button variant="quiet" busy={remove.isPending} onClick={() => remove.mutate(id, say(`${name} is removed.`))}>
          Remove
        </Button>
      </div>
    </li>
  );
}
