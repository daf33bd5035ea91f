import { useState, type ReactNode } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Change } from '../../lib/api/kept.ts';
import type { FormPart } from '../../lib/forms/form-part.ts';
import type { Resource } from '../../../shared/rules/authorization.ts';
import { useFarm, useMay } from '../../lib/session/session.ts';
import { ButtonLink, PageHeading, useToast } from '../index.ts';

interface EditorProps<Item extends { name: string; version: number }, Body> {
  title: string;
  /** What it is in the table of rights. */
  resource: Resource;
  /** What is edited; null for a new one. */
  stored: Item | null;
  save: (change: Change<Body>) => Promise<Item>;
  /** Where to go once it is saved. */
  after: (item: Item) => string;
  cancelTo: string;
  children: (part: FormPart<Item, Body>) => ReactNode;
}

/** The page of a form: saves, says so, and leads on; an edit tells the server which copy it was made from. */
export function RecordEditor<Item extends { name: string; version: number }, Body>({ title, resource, stored, save, after, cancelTo, children }: EditorProps<Item, Body>) {
  const navigate = useNavigate();
  const toast = useToast();
  const may = useMay();
  const { role } = useFarm();
  const [opened] = useState(stored);

  async function send(body: Body) {
    const item = await save({ body, version: opened?.version });
    toast(opened ? `${item.name} is saved.` : `${item.name} is added.`);
    await navigate(after(item), { replace: true });
  }

  if (!may(opened ? 'update' : 'create', resource)) {
    return (
      <>
        <PageHeading title={title} />
        <p className="mb-4">As {role} of this farm you may look but not change this. An owner can give you another role.</p>
        <ButtonLink to={cancelTo}>Back</ButtonLink>
      </>
    );
  }
  return (
    <>
      <PageHeading title={title} />
      {children({ stored: opened, save: send, cancelTo })}
    </>
  );
}
