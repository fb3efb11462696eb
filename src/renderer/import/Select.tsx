/** A labelled list of options for the import sheet. */

import { useId } from 'preact/hooks';

interface Props {
  label: string;
  value: string;
  options: readonly { readonly value: string; readonly name: string }[];
  choose: (value: string) => void;
}

export function Select({ label, value, options, choose }: Props) {
  const id = useId();
  return (
    <div class="sheet-choice">
      <label for={id}>{label}</label>
      <select id={id} value={value} onChange={(event) => choose(event.currentTarget.value)}>
        {options.map((option) => (
          <option key={option.value} value={option.value} selected={option.value === value}>
            {option.name}
          </option>
        ))}
      </select>
    </div>
  );
}
