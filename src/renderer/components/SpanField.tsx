/** A number of a view, not of the study: its end of a span, a count. Committed when it is left or Enter is pressed. */

import { useId, useState } from 'preact/hooks';
import { formatQuantity, parseQuantity } from '../../core/index';

type Kind = Parameters<typeof parseQuantity>[1]['kind'];

interface Props {
  label: string;
  kind: Kind;
  /** As the core's quantity reader calls it, and as it is shown. */
  unit: string;
  shownUnit: string;
  value: number;
  low: number;
  high: number;
  whole?: boolean;
  commit: (value: number) => void;
}

export function SpanField({ label, kind, unit, shownUnit, value, low, high, whole, commit }: Props) {
  const id = useId();
  const [text, setText] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);

  function take(typed: string): void {
    const parsed = parseQuantity(typed, { kind, shown: unit });
    const allowed = `${low} to ${high} ${shownUnit} are allowed${whole ? ', whole numbers' : ''}`;
    const isAllowed = (number: number): boolean =>
      number >= low && number <= high && !(whole && !Number.isInteger(number));
    if ('problem' in parsed) setProblem(parsed.problem);
    else if (!isAllowed(parsed.value)) setProblem(allowed);
    else {
      setProblem(null);
      setText(null);
      if (parsed.value !== value) commit(parsed.value);
    }
  }

  return (
    <div class={`span-field ${problem ? 'field-wrong' : ''}`}>
      <label for={id}>{label}</label>
      <div class="field-box">
        <input
          id={id}
          type="text"
          inputMode="decimal"
          autocomplete="off"
          value={text ?? formatQuantity(value, kind)}
          aria-invalid={problem !== null}
          aria-describedby={problem ? `${id}-says` : undefined}
          onInput={(event) => setText(event.currentTarget.value)}
          onBlur={() => text !== null && take(text)}
          onKeyDown={(event) => {
            if (event.key === 'Enter') take(event.currentTarget.value);
            if (event.key !== 'Escape') return;
            setText(null);
            setProblem(null);
          }}
        />
        {shownUnit && <span class="field-unit">{shownUnit}</span>}
      </div>
      {problem && (
        <p class="field-message" id={`${id}-says`} role="alert">
          {problem}
        </p>
      )}
    </div>
  );
}
