/** A reading that copies its full-precision value when pressed. */

import { exactDigits } from '../state/digits';
import { say, sayError } from '../state/viewState';

interface Props {
  /** What it is, for the tooltip and for speech. */
  name: string;
  value: number | null;
  shown: string;
  unit?: string;
  class?: string;
}

export function Copyable({ name, value, shown, unit = '', class: extra = '' }: Props) {
  async function copy(): Promise<void> {
    if (value === null) return;
    try {
      await navigator.clipboard.writeText(exactDigits(value));
      say(`${name} copied`);
    } catch {
      sayError('The clipboard could not be written');
    }
  }
  return (
    <button
      type="button"
      class={`copyable ${extra}`}
      title={`${name}: copy ${value === null ? 'nothing' : exactDigits(value)}`}
      disabled={value === null}
      onClick={() => void copy()}
    >
      <span class="copyable-value">{shown}</span> {unit && <span class="unit">{unit}</span>}
    </button>
  );
}
