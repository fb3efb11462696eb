/** What the file leaves open and a person must say; nothing is chosen beforehand. */

import { useId } from 'preact/hooks';
import { CONCENTRATION_UNITS, DECIMALS, DEPTH_UNITS, type Option } from './names';
import type { TableSketch } from './tableWorker';
import type { TableState } from './useTable';

interface Props {
  state: TableState;
  sketch: TableSketch;
}

type TableQuestion = TableSketch['questions'][number];

const NAMES: readonly Option[] = [...DECIMALS, ...DEPTH_UNITS, ...CONCENTRATION_UNITS];

export function TableQuestions({ state, sketch }: Props) {
  return (
    <>
      {sketch.questions.map((question) => (
        <OneQuestion key={`${question.kind} ${question.message}`} question={question} state={state} />
      ))}
    </>
  );
}

function OneQuestion({ question, state }: { question: TableQuestion; state: TableState }) {
  const id = useId();
  const { kind } = question;
  const answer = (value: string): void => {
    if (kind !== 'columns') state.state({ ...state.choice, [kind]: value }, state.columns);
  };
  return (
    <fieldset class="sheet-question">
      <legend>To be answered</legend>
      <p>
        {question.line !== undefined && <b>line {question.line}: </b>}
        {question.message}
      </p>
      {kind === 'columns' ? (
        <p class="card-note">Choose the depth and the concentration column below.</p>
      ) : (
        <div class="sheet-answers">
          {question.options.map((option) => (
            <label key={option}>
              <input type="radio" name={id} value={option} onChange={() => answer(option)} />
              {NAMES.find(({ value }) => value === option)?.name ?? option}
            </label>
          ))}
        </div>
      )}
    </fieldset>
  );
}
