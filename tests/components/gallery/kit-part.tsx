import { useState } from 'react';
import { Button, ButtonLink, Dialog, EmptyState, Icon, IconButton, LastWord, LocalTime, Mark, PageHeading, Panel, PanelErrorBoundary, Quantity, SegmentedControl, Skeleton, ThemeToggle, useToast, VerdictSign } from '../../../src/components/index.ts';

const reader = { units: 'us', timeZone: 'America/Los_Angeles' } as const;
const iconNames = ['daybreak', 'plan', 'shelf', 'farm', 'bell', 'people', 'person', 'more', 'close', 'back', 'find', 'save', 'up', 'down'] as const;

function Broken(): never {
  throw new Error('The forecast did not answer.');
}

/** Everything that is pressed, said or waited for. */
export function KitPart() {
  const toast = useToast();
  const [open, setOpen] = useState(false);
  const [span, setSpan] = useState<'day' | 'week'>('day');
  return (
    <>
      <PageHeading title="Plans" over="Quillbrook" up={['/', 'Daybreak']}>
        <ButtonLink to="/" variant="primary">
          Make a plan
        </ButtonLink>
      </PageHeading>
      <p className="mb-6 flex items-center gap-4">
        <VerdictSign state="go" size={84} silent />
        <span className="answer">Go</span>
      </p>
      <Panel title="Acts" actions={<Button variant="quiet">Beside the title</Button>}>
        <p className="flex flex-wrap items-center gap-3">
          <Button onClick={() => setOpen(true)}>Open the dialog</Button>
          <Button variant="quiet" onClick={() => toast('North rows is archived.', { undo: () => toast('North rows is back.') })}>
            Archive
          </Button>
          <Button variant="link">A quiet way</Button>
          <Button busy>Saving</Button>
          <IconButton icon="close" label="Shut" />
        </p>
        <div className="mt-4">
          <SegmentedControl legend="Span" value={span} onChange={setSpan} options={[['day', 'One day'], ['week', 'One week']]} />
        </div>
        <div className="mt-4">
          <ThemeToggle place={{ latitude: 44.9, longitude: -123.1 }} />
        </div>
      </Panel>
      <Panel title="Said">
        <p>
          Sunrise at <LocalTime instant="2026-06-10T12:26:00Z" reader={reader} />, wind <Quantity value={3.5} of="speed" />, told <LocalTime instant="2026-06-10T03:00:00Z" reader={reader} as="date" />. <Mark>Draft</Mark> <Mark strong>Told</Mark>
        </p>
        <p className="mt-3 flex flex-wrap gap-4">
          {iconNames.map((name) => (
            <Icon key={name} name={name} />
          ))}
        </p>
      </Panel>
      <Panel title="Waiting, empty, failed">
        <Skeleton />
        <div className="my-4">
          <EmptyState>No block yet. Add the first one, and mornings can be judged for it.</EmptyState>
        </div>
        <PanelErrorBoundary onRetry={() => undefined}>
          <Broken />
        </PanelErrorBoundary>
      </Panel>
      <LastWord />
      <Dialog open={open} onClose={() => setOpen(false)} title="Take the label in hand">
        <p>Every figure here is copied from it; where they differ, the label is right.</p>
      </Dialog>
    </>
  );
}
