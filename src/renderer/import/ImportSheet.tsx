/** A table on its way into the study: how it was read, what is in it, which profiles to take. The study waits untouched. */

import { useEffect, useLayoutEffect, useRef } from 'preact/hooks';
import { importing } from '../state/files';
import { addAll } from '../state/stepActions';
import { say } from '../state/viewState';
import { ProfileList } from './ProfileList';
import { ReadingChoices } from './ReadingChoices';
import { TablePreview } from './TablePreview';
import { TableQuestions } from './TableQuestions';
import { useTable } from './useTable';

interface Props {
  table: { readonly name: string; readonly bytes: Uint8Array };
}

const close = (): void => {
  importing.value = null;
};

const megabytes = (bytes: number): string =>
  bytes < 1e5 ? `${(bytes / 1e3).toFixed(1)} kB` : `${(bytes / 1e6).toFixed(1)} MB`;

export function ImportSheet({ table }: Props) {
  const state = useTable(table);
  const { sketch, problem, isBusy, wanted } = state;
  const heading = useRef<HTMLHeadingElement>(null);
  const taken = wanted.filter(({ on, dopant }) => on && dopant !== null).length;
  const lacksDopant = wanted.some(({ on, dopant }) => on && dopant === null);
  const isReady = !isBusy && problem === null && taken > 0 && !lacksDopant;

  useEffect(() => heading.current?.focus(), []);
  useLayoutEffect(() => {
    // An answered question takes the focus with it; without one the keys would reach nothing.
    if (document.activeElement === document.body) heading.current?.focus();
  }, [sketch]);

  async function take(): Promise<void> {
    const steps = await state.embed();
    if (!steps) return;
    close();
    addAll(steps, `importing ${table.name}`);
    say(`${steps.length === 1 ? 'One profile' : `${steps.length} profiles`} taken from ${table.name}`);
  }

  return (
    <section
      class="sheet"
      aria-label={`Import ${table.name}`}
      aria-busy={isBusy}
      onKeyDown={(event) => {
        if (event.key === 'Escape') close();
      }}
    >
      <header class="sheet-head">
        <h2 ref={heading} tabIndex={-1}>
          Import <span class="sheet-file">{table.name}</span>
          <span class="layer-span">{megabytes(table.bytes.length)}</span>
        </h2>
        <button type="button" class="button" onClick={close}>
          Cancel
        </button>
        <button type="button" class="button button-main" disabled={!isReady} onClick={() => void take()}>
          {taken > 1 ? `Add ${taken} profiles` : 'Add the profile'}
        </button>
      </header>
      <div class="sheet-body">
        {isBusy && (
          <p class="sheet-progress" role="status">
            Reading {megabytes(table.bytes.length)} … Cancel gives it up; the study stays as it is.
          </p>
        )}
        {problem && (
          <p class="sheet-problem" role="alert">
            {problem}
          </p>
        )}
        {sketch && (
          <>
            <TableQuestions state={state} sketch={sketch} />
            <ReadingChoices state={state} sketch={sketch} />
            <ProfileList state={state} sketch={sketch} />
            {lacksDopant && (
              <p class="field-message">Say which dopant each ticked profile is; its heading does not tell.</p>
            )}
            {sketch.warnings.length > 0 && (
              <ul class="sheet-warnings" aria-label="Remarks on the table">
                {sketch.warnings.map((warning) => (
                  <li key={`${warning.code} ${warning.line}`}>
                    {warning.line !== undefined && <b>line {warning.line}: </b>}
                    {warning.message}
                  </li>
                ))}
              </ul>
            )}
            <TablePreview sketch={sketch} />
          </>
        )}
      </div>
    </section>
  );
}
