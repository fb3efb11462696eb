/**
 * The field of every quantity: a number or a short sum with or without a unit. The study follows while the text is valid,
 * leaving the field makes one undo step of it, Esc takes it back, and text that cannot be used says why beside itself.
 */

import { useEffect, useId, useLayoutEffect, useRef, useState } from 'preact/hooks';
import { formatQuantity, parseQuantity } from '../../core/index';
import { valueAt } from '../state/path';
import { solveProblem } from '../state/solver';
import { stepped } from '../state/stepping';
import { cancelEdit, finishEdit, rewrites, study, tryValue } from '../state/studySession';
import { type DisplayUnit, quantityKind, shownUnit } from '../state/units';
import { focusRequest } from '../state/viewState';

interface Props {
  /** Key path in the study. */
  path: string;
  label: string;
  unit: DisplayUnit;
  /** What an empty field means; absent where a value is needed. */
  whenEmpty?: string;
  /** Names the change for undo: "dose of step 1". */
  undoName: string;
  disabled?: boolean;
}

/** A message about half-typed text waits this long. */
const PATIENCE_MS = 500;

type Judged = { value: number | undefined; unitTyped?: string } | { problem: string };

export function QuantityField({ path, label, unit, whenEmpty, undoName, disabled }: Props) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [text, setText] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [patient, setPatient] = useState(false);
  const [converted, setConverted] = useState<string | null>(null);

  const kind = quantityKind(unit);
  const value = valueAt(study.value, path) as number | undefined;
  const solverSays = solveProblem.value?.key === path ? solveProblem.value.message : null;
  const message = (patient ? null : problem) ?? solverSays;

  useEffect(reset, [rewrites.value, path]);
  useEffect(() => {
    if (!patient) return;
    const timer = setTimeout(() => setPatient(false), PATIENCE_MS);
    return () => clearTimeout(timer);
  }, [text]);
  useLayoutEffect(() => {
    if (focusRequest.value !== path) return;
    focusRequest.value = null;
    input.current?.scrollIntoView({ block: 'nearest' });
    input.current?.focus();
  }, [focusRequest.value, path]);

  function reset(): void {
    setText(null);
    setProblem(null);
    setConverted(null);
  }

  function judge(typed: string): Judged {
    if (typed.trim() === '' && whenEmpty !== undefined) return { value: undefined };
    return parseQuantity(typed, { shown: unit, kind });
  }

  /** Lets the study follow the text; text that cannot be used leaves it as it was before. */
  function follow(typed: string): void {
    const judged = judge(typed);
    const problems =
      'problem' in judged ? [{ message: judged.problem }] : tryValue(path, judged.value, undoName);
    if (problems.length > 0) cancelEdit(path);
    setProblem(problems[0]?.message ?? null);
    const showConverted =
      'unitTyped' in judged && judged.unitTyped !== undefined && judged.unitTyped !== unit;
    setConverted(showConverted ? formatQuantity(judged.value as number, kind) : null);
  }

  function onInput(typed: string): void {
    setText(typed);
    setPatient(true);
    follow(typed);
  }

  function commit(): void {
    setPatient(false);
    finishEdit(path);
    if (problem === null) reset();
  }

  function step(up: boolean, coarse: boolean): void {
    const judged = text === null ? { value } : judge(text);
    if ('problem' in judged || judged.value === undefined) return;
    const next = stepped(judged.value, up, coarse);
    if (tryValue(path, next, undoName).length === 0) reset();
  }

  function onKeyDown(event: KeyboardEvent): void {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      event.preventDefault();
      step(event.key === 'ArrowUp', event.shiftKey);
    } else if (event.key === 'Enter') {
      commit();
      input.current?.select();
    } else if (event.key === 'Escape') {
      event.stopPropagation();
      cancelEdit(path);
      reset();
    }
  }

  return (
    <div class={`field ${message ? 'field-wrong' : ''}`}>
      <label for={id}>{label}</label>
      <div class="field-box">
        <input
          id={id}
          ref={input}
          type="text"
          inputMode="decimal"
          autocomplete="off"
          spellcheck={false}
          data-path={path}
          disabled={disabled}
          value={text ?? (value === undefined ? '' : formatQuantity(value, kind))}
          placeholder={whenEmpty}
          aria-invalid={message !== null}
          aria-describedby={`${id}-unit${message ? ` ${id}-says` : ''}`}
          onInput={(event) => onInput(event.currentTarget.value)}
          onFocus={(event) => event.currentTarget.select()}
          onBlur={commit}
          onKeyDown={onKeyDown}
        />
        <span class="field-unit" id={`${id}-unit`}>
          {shownUnit(unit)}
        </span>
      </div>
      {converted && !message && (
        <p class="field-note">
          = {converted} {shownUnit(unit)}
        </p>
      )}
      {message && (
        <p class="field-message" id={`${id}-says`} role="alert">
          {message}
        </p>
      )}
    </div>
  );
}
