import { useId } from 'react';

interface SegmentedControlProps<Value extends string> {
  legend: string;
  /** Keeps the legend for screen readers only. */
  legendHidden?: boolean;
  value: Value;
  onChange: (value: Value) => void;
  options: readonly (readonly [value: Value, words: string])[];
}

/** One of a few, side by side: the browser's own radio buttons, so that arrow keys and forced colours work. */
export function SegmentedControl<Value extends string>({ legend, legendHidden = false, value, onChange, options }: SegmentedControlProps<Value>) {
  const name = useId();
  return (
    <fieldset>
      <legend className={legendHidden ? 'sr-only' : 'mb-2 font-semibold'}>{legend}</legend>
      <div className="flex flex-wrap gap-2">
        {options.map(([each, words]) => (
          <label key={each} className="inline-flex min-h-touch cursor-pointer items-center gap-3 rounded-lg border-[1.5px] border-ink/50 px-4 has-checked:border-ink has-checked:bg-paper-sunk has-checked:font-semibold has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-needle">
            <input type="radio" name={name} value={each} checked={each === value} onChange={() => onChange(each)} className="size-5 accent-needle outline-none" />
            {words}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
