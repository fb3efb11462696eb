/** A field with a closed list of options; choosing is one undo step. */

import { useId, useLayoutEffect, useRef } from 'preact/hooks';
import { solveProblem } from '../state/solver';
import { focusRequest } from '../state/viewState';

interface Props {
  path: string;
  label: string;
  options: readonly { readonly value: string; readonly name: string }[];
  chosen: string;
  choose: (option: string) => void;
}

export function ChoiceField({ path, label, options, chosen, choose }: Props) {
  const id = useId();
  const select = useRef<HTMLSelectElement>(null);
  const message = solveProblem.value?.key === path ? solveProblem.value.message : null;
  useLayoutEffect(() => {
    if (focusRequest.value !== path) return;
    focusRequest.value = null;
    select.current?.focus();
  }, [focusRequest.value, path]);
  return (
    <div class={`field ${message ? 'field-wrong' : ''}`}>
      <label for={id}>{label}</label>
      <div class="field-box">
        <select
          id={id}
          ref={select}
          data-path={path}
          value={chosen}
          aria-invalid={message !== null}
          aria-describedby={message ? `${id}-says` : undefined}
          onChange={(event) => choose(event.currentTarget.value)}
        >
          {options.map(({ value, name }) => (
            <option key={value} value={value} selected={value === chosen}>
              {name}
            </option>
          ))}
        </select>
      </div>
      {message && (
        <p class="field-message" id={`${id}-says`} role="alert">
          {message}
        </p>
      )}
    </div>
  );
}
