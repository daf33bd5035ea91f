import { Button, useToast } from '../index.ts';

interface ArchiveButtonProps {
  item: { id: string; name: string; archivedAt: string | null };
  archive: { mutateAsync: (change: { id: string; archived: boolean }) => Promise<unknown>; isPending: boolean };
}

/** Puts a thing away, or brings it back; the word of it offers to undo. */
export function ArchiveButton({ item, archive }: ArchiveButtonProps) {
  const toast = useToast();

  async function set(archived: boolean) {
    try {
      await archive.mutateAsync({ id: item.id, archived });
      toast(archived ? `${item.name} is archived.` : `${item.name} is back.`, { undo: () => void set(!archived) });
    } catch (error) {
      toast(error instanceof Error ? error.message : 'That did not work. Try again.');
    }
  }

  return (
    <Button variant="quiet" busy={archive.isPending} onClick={() => void set(item.archivedAt === null)}>
      {item.archivedAt === null ? 'Archive' : 'Bring back'}
    </Button>
  );
}
