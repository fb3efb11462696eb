/** The last line: what stands in the way of a solution, warnings that unfold, what was just done, how long solving took. */

import { useState } from 'preact/hooks';
import type { Warning } from '../../core/index';
import { shown, slow, solveProblem } from '../state/solver';
import { draft } from '../state/studySession';
import { focusStep, notice } from '../state/viewState';
import { Icon } from './Icon';

/** Puts the focus on the step, or the field, that a key names. */
function goTo(key: string): void {
  const at = Number(/^steps\[(\d+)\]/.exec(key)?.[1]);
  const id = draft.value.stepIds[at];
  if (id !== undefined) focusStep(id, key);
}

export function StatusBar() {
  const [open, setOpen] = useState(false);
  const warnings = shown.value?.solution.result.warnings ?? [];
  const problem = solveProblem.value;
  return (
    <footer class="status">
      {open && warnings.length > 0 && <WarningList warnings={warnings} />}
      <div class="status-line">
        <button
          type="button"
          class={`status-warnings ${warnings.length > 0 ? 'some' : ''}`}
          aria-expanded={open && warnings.length > 0}
          disabled={warnings.length === 0}
          onClick={() => setOpen(!open)}
        >
          {warnings.length > 0 && <Icon name="warning" />}
          {warnings.length === 0
            ? 'No warnings'
            : warnings.length === 1
              ? '1 warning'
              : `${warnings.length} warnings`}
        </button>
        {problem ? (
          <div class="status-notice" role="alert">
            <button type="button" class="status-problem" onClick={() => goTo(problem.key)}>
              {problem.key && <code>{problem.key}</code>} {problem.message}. Shown: the last valid recipe.
            </button>
          </div>
        ) : (
          <p
            class={`status-notice ${notice.value?.isError ? 'is-error' : ''}`}
            role="status"
            title={notice.value?.text}
          >
            {notice.value?.text ?? warnings[0]?.message ?? ''}
          </p>
        )}
        <span class="status-time">
          {slow.value
            ? 'solving …'
            : shown.value
              ? `solved in ${shown.value.milliseconds.toFixed(1)} ms, ${shown.value.solution.result.mesh.nodes} nodes`
              : 'solving …'}
        </span>
      </div>
    </footer>
  );
}

function WarningList({ warnings }: { warnings: readonly Warning[] }) {
  return (
    <ul class="warning-list" aria-label="Warnings">
      {warnings.map((warning, i) => (
        <li key={i}>
          {warning.step === undefined ? (
            <span class="warning-row">{warning.message}</span>
          ) : (
            <button
              type="button"
              class="warning-row"
              onClick={() => goTo(`steps[${(warning.step as number) - 1}]`)}
            >
              <span class="step-number">{warning.step}</span> {warning.message}
            </button>
          )}
        </li>
      ))}
    </ul>
  );
}
