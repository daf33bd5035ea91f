import { useId } from 'react';
import { Problem } from './fields.tsx';

interface FileFieldProps {
  label: string;
  /** What may be chosen, as the browser names it: `application/pdf`. */
  accept: string;
  hint?: string;
  problem?: string | undefined;
  busy?: boolean;
  onFile: (file: File) => void;
}

/** One file to send; a chosen file goes at once. */
export function FileField({ label, accept, hint, problem, busy = false, onFile }: FileFieldProps) {
  const id = useId();
  const describedBy = [hint && `${id}-hint`, problem && `${id}-problem`].filter(Boolean).join(' ') || undefined;
  return (
    <div>
      <label htmlFor={id} className="block font-semibold">
        {label}
      </label>
      <input
        id={id}
        type="file"
        accept={accept}
        disabled={busy}
        aria-invalid={problem ? true : undefined}
        aria-describedby={describedBy}
        className="min-h-touch max-w-full py-2 file:mr-4 file:min-h-touch file:cursor-pointer file:rounded-lg file:border-[1.5px] file:border-ink/50 file:bg-transparent file:px-5"
        onChange={(event) => {
          const file = event.target.files?.[0];
          if (file) onFile(file);
        }}
      />
      {hint && (
        <p id={`${id}-hint`} className="mt-1 text-sm text-ink-soft">
          {hint}
        </p>
      )}
      {problem && <Problem id={`${id}-problem`}>{problem}</Problem>}
    </div>
  );
}
