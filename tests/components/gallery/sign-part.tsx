import { VerdictSign } from '../../../src/components/index.ts';

const states = ['go', 'hold', 'unknown'] as const;

/** The disc and the horizon in every state, from 24 px to 600 px. */
export function SignPart() {
  return (
    <div className="space-y-6">
      {[24, 32, 48, 96, 200].map((size) => (
        <p key={size} className="flex flex-wrap items-end gap-6">
          {states.map((state) => (
            <VerdictSign key={state} state={state} size={size} />
          ))}
        </p>
      ))}
      <p className="hidden lg:block">
        <VerdictSign state="go" size={600} />
      </p>
    </div>
  );
}
