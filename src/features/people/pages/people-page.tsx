import { ButtonLink, PageHeading, Panel } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useMay } from '../../../lib/session/session.ts';
import { InviteForm } from '../components/invite-form.tsx';
import { MemberList } from '../components/member-list.tsx';

export function PeoplePage() {
  const { id: farmId } = useFarm();
  const may = useMay();
  return (
    <>
      <PageHeading title="People">{may('read', 'audit') && <ButtonLink to={paths.audit(farmId)}>What was changed</ButtonLink>}</PageHeading>
      <QueryPanel title="Who belongs to the farm">
        <MemberList />
      </QueryPanel>
      {may('create', 'person') && (
        <Panel title="Invite someone">
          <InviteForm />
        </Panel>
      )}
    </>
  );
}
