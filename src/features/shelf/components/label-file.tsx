import { useId, useState } from 'react';
import type { Product } from '../../../../shared/api/plans.ts';
import { useToast } from '../../../components/index.ts';
import { dateTime } from '../../../lib/time.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { labelAddress, useUploadLabel } from '../api/upload-label.ts';

const bytesMax = 10 * 1024 * 1024;

const size = (bytes: number): string => (bytes < 1024 * 1024 ? `${Math.max(1, Math.round(bytes / 1024))} kB` : `${(bytes / 1024 / 1024).toFixed(1)} MB`);

/** What is wrong with a file before it is sent; the server looks again. */
function fileProblem(file: File): string | null {
  if (file.type !== 'application/pdf') return 'Choose a PDF file; this one is of another kind.';
  if (file.size > bytesMax) return `Choose a file of at most 10 MB; this one has ${size(file.size)}.`;
  return null;
}

/** The label as the maker printed it, kept beside what was copied from it. */
export function LabelFile({ product, mayChange }: { product: Product; mayChange: boolean }) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const upload = useUploadLabel(farmId, product.id);
  const toast = useToast();
  const inputId = useId();
  const [problem, setProblem] = useState<string | null>(null);

  async function take(file: File | undefined) {
    if (!file) return;
    const wrong = fileProblem(file);
    setProblem(wrong);
    if (wrong) return;
    try {
      await upload.mutateAsync(file);
      toast('The label is kept.');
    } catch (error) {
      setProblem(error instanceof Error ? error.message : 'The label could not be sent. Try again.');
    }
  }

  return (
    <div className="space-y-3">
      {product.labelFile ? (
        <p>
          <a href={labelAddress(farmId, product.id)} target="_blank" rel="noreferrer" className="inline-flex min-h-touch items-center font-semibold underline">
            {product.labelFile.name}
          </a>{' '}
          <span className="text-sm text-ink-soft">
            {size(product.labelFile.bytes)}, kept {dateTime(product.labelFile.uploadedAt, reader)}
          </span>
        </p>
      ) : (
        <p>No label file yet. {mayChange ? 'Keep the PDF here, and it is at hand in the field.' : 'An owner or applicator can add it.'}</p>
      )}
      {mayChange && (
        <p>
          <label htmlFor={inputId} className="block font-semibold">
            {product.labelFile ? 'Put a newer label in its place' : 'Choose the label'} (PDF, at most 10 MB)
          </label>
          <input id={inputId} type="file" accept="application/pdf" disabled={upload.isPending} aria-describedby={problem ? `${inputId}-problem` : undefined} className="min-h-touch max-w-full py-2 file:mr-4 file:min-h-touch file:rounded-lg file:border-[1.5px] file:border-ink/25 file:bg-transparent file:px-5" onChange={(event) => void take(event.target.files?.[0])} />
        </p>
      )}
      {upload.isPending && <p role="status">Sending the label…</p>}
      {problem && (
        <p id={`${inputId}-problem`} role="alert">
          {problem}
        </p>
      )}
    </div>
  );
}
