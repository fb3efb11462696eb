/** One recipe step: a line that says what it does, and its fields in place when opened. */

import { useLayoutEffect, useRef } from 'preact/hooks';
import type { StudyStep } from '../../core/index';
import { shown, solveProblem } from '../state/solver';
import { duplicate, move, remove, toggle } from '../state/stepActions';
import { STEP_KINDS } from '../state/stepKinds';
import { stepSummary } from '../state/stepSummary';
import { draft } from '../state/studySession';
import { focusRequest, openSteps, setOpen } from '../state/viewState';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import { StepFields } from './StepFields';
import { TextField } from './TextField';

interface Props {
  step: StudyStep;
  at: number;
  id: number;
  /** A dragged step would go in front of this one. */
  isGap: boolean;
  onGrab: (id: number | null) => void;
}

export function StepCard({ step, at, id, isGap, onGrab }: Props) {
  const head = useRef<HTMLButtonElement>(null);
  const { title, caution } = STEP_KINDS[step.step];
  const open = openSteps.value.has(id);
  const number = at + 1;
  const root = `steps[${at}]`;
  const problem = solveProblem.value;
  const isWrong = problem !== null && (problem.key === root || problem.key.startsWith(`${root}.`));
  const warnings = (shown.value?.solution.result.warnings ?? []).filter((each) => each.step === number);
  const bodyId = `step-${id}`;
  const name = step.label || title;

  useLayoutEffect(() => {
    if (focusRequest.value !== root) return;
    focusRequest.value = null;
    head.current?.scrollIntoView({ block: 'nearest' });
    head.current?.focus();
  }, [focusRequest.value, root]);

  function onKeyDown(event: KeyboardEvent): void {
    if (event.altKey && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) {
      event.preventDefault();
      move(at, event.key === 'ArrowUp' ? at - 1 : at + 1);
    } else if (event.target === head.current && event.key === 'Delete') remove(at);
  }

  return (
    <li
      class={`card step ${open ? 'card-open' : ''} ${step.disabled ? 'step-off' : ''} ${isWrong ? 'step-wrong' : ''} ${isGap ? 'gap-before' : ''}`}
      data-step={number}
      onKeyDown={onKeyDown}
    >
      <div class="step-head">
        {/* biome-ignore lint/a11y/noStaticElementInteractions: by keyboard the card itself moves, with Alt and the arrows. */}
        <span
          class="grip"
          title="Drag to move this step (or Alt with up and down arrow)"
          draggable
          onDragStart={(event) => {
            event.dataTransfer?.setData('text/plain', name);
            onGrab(id);
          }}
          onDragEnd={() => onGrab(null)}
        >
          <Icon name="grip" />
        </span>
        <button
          type="button"
          class="card-head"
          ref={head}
          aria-expanded={open}
          aria-controls={open ? bodyId : undefined}
          aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown Delete"
          onClick={() => setOpen(id, !open)}
        >
          <span class="step-number">{number}</span>
          <span class="step-text">
            <span class="card-title" title={name}>
              {name}
              {step.disabled && <span class="tag">off</span>}
              {isWrong && <span class="tag tag-wrong">cannot be solved</span>}
              {warnings.length > 0 && (
                <span class="tag tag-warning" title={warnings.map((each) => each.message).join('\n')}>
                  {warnings.length} {warnings.length === 1 ? 'warning' : 'warnings'}
                </span>
              )}
            </span>
            <span class="card-summary" title={stepSummary(step)}>
              {stepSummary(step)}
            </span>
          </span>
          <Icon name="chevron" />
        </button>
      </div>
      {open && (
        <div class="card-body" id={bodyId}>
          <StepFields step={step} at={at} />
          <TextField
            path={`${root}.label`}
            label="Label"
            placeholder={title}
            undoName={`label of step ${number}`}
            optional
          />
          {isWrong && problem.key === root && (
            <p class="field-message" role="alert">
              {problem.message}
            </p>
          )}
          {caution && (
            <p class="caution">
              <Icon name="warning" />
              <span>{caution}</span>
            </p>
          )}
          <div class="step-tools" role="toolbar" aria-label={`Step ${number}`}>
            <IconButton
              icon="up"
              name="Move up (Alt+Up)"
              disabled={at === 0}
              onClick={() => move(at, at - 1)}
            />
            <IconButton
              icon="down"
              name="Move down (Alt+Down)"
              disabled={number === draft.value.stepIds.length}
              onClick={() => move(at, at + 1)}
            />
            <IconButton
              icon={step.disabled ? 'eyeOff' : 'eye'}
              name={step.disabled ? 'Switch on' : 'Switch off'}
              pressed={step.disabled === true}
              onClick={() => toggle(at)}
            />
            <IconButton icon="copy" name="Duplicate" onClick={() => duplicate(at)} />
            <IconButton icon="close" name="Remove (Delete)" onClick={() => remove(at)} />
          </div>
        </div>
      )}
    </li>
  );
}
