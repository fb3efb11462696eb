/** The fields of one recipe step, from the list of what its kind shows. */

import type { StudyStep } from '../../core/index';
import { type Draft, withStudy } from '../state/draft';
import { valueAt, withValueAt } from '../state/path';
import { type ChoiceSpec, stepFields } from '../state/stepFields';
import { edit, study } from '../state/studySession';
import { ChoiceField } from './ChoiceField';
import { QuantityField } from './QuantityField';

interface Props {
  step: StudyStep;
  at: number;
}

export function StepFields({ step, at }: Props) {
  const root = `steps[${at}]`;
  const undoName = (label: string): string => `${label.toLowerCase()} of step ${at + 1}`;
  const choose = (spec: ChoiceSpec, option: string): void => {
    const path = spec.choose ? root : `${root}.${spec.key}`;
    const value = spec.choose ? spec.choose(option) : option;
    edit(undoName(spec.label), (draft: Draft) => withStudy(draft, withValueAt(draft.study, path, value)));
  };
  return (
    <>
      {stepFields(step, study.value).map((spec) =>
        spec.kind === 'quantity' ? (
          <QuantityField
            key={spec.key}
            path={`${root}.${spec.key}`}
            label={spec.label}
            unit={spec.unit}
            whenEmpty={spec.whenEmpty}
            undoName={undoName(spec.label)}
          />
        ) : (
          <ChoiceField
            key={spec.key}
            path={`${root}.${spec.key}`}
            label={spec.label}
            options={spec.options}
            chosen={spec.chosen ?? String(valueAt(step, spec.key))}
            choose={(option) => choose(spec, option)}
          />
        ),
      )}
    </>
  );
}
