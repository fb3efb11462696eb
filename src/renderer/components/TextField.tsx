/** A field for free text: the study follows while typing, leaving the field makes one undo step. */

import { useId } from 'preact/hooks';
import { valueAt } from '../state/path';
import { cancelEdit, finishEdit, study, tryValue } from '../state/studySession';

interface Props {
  path: string;
  label: string;
  undoName: string;
  placeholder?: string;
  /** Whether an empty text removes the key from the document. */
  optional?: boolean;
  class?: string;
}

export function TextField({ path, label, undoName, placeholder, optional, class: extra = '' }: Props) {
  const id = useId();
  const value = (valueAt(study.value, path) as string | undefined) ?? '';
  return (
    <div class={`field ${extra}`}>
      <label for={id}>{label}</label>
      <div class="field-box">
        <input
          id={id}
          type="text"
          autocomplete="off"
          spellcheck={false}
          maxLength={200}
          data-path={path}
          value={value}
          placeholder={placeholder}
          title={value}
          onInput={({ currentTarget: { value: typed } }) =>
            tryValue(path, optional && typed === '' ? undefined : typed, undoName)
          }
          onBlur={() => finishEdit(path)}
          onKeyDown={(event) => {
            if (event.key === 'Enter') event.currentTarget.blur();
            if (event.key !== 'Escape') return;
            event.stopPropagation();
            cancelEdit(path);
          }}
        />
      </div>
    </div>
  );
}
