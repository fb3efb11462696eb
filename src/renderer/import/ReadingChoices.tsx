/** How the table was read: every choice is detected and can be changed. */

import type { TableChoice } from '../../core/index';
import {
  CONCENTRATION_UNITS,
  DECIMALS,
  DELIMITERS,
  DEPTH_UNITS,
  ENCODINGS,
  nameOf,
  type Option,
} from './names';
import { Select } from './Select';
import type { TableSketch } from './tableWorker';
import type { TableState } from './useTable';

interface Props {
  state: TableState;
  sketch: TableSketch;
}

const SKIPS: readonly Option[] = Array.from({ length: 41 }, (_, i) => ({
  value: String(i),
  name: String(i),
}));

const CHOICES: readonly [keyof TableChoice, string, readonly Option[]][] = [
  ['delimiter', 'Columns are parted by', DELIMITERS],
  ['decimal', 'Decimal sign', DECIMALS],
  ['depthUnit', 'Depth unit', DEPTH_UNITS],
  ['concentrationUnit', 'Concentration unit', CONCENTRATION_UNITS],
  ['encoding', 'Encoding', ENCODINGS],
  ['skip', 'Lines to leave out on top', SKIPS],
];

export function ReadingChoices({ state, sketch }: Props) {
  function choose(key: keyof TableChoice, value: string): void {
    const { [key]: _, ...rest } = state.choice;
    const stated = value === '' ? rest : { ...rest, [key]: key === 'skip' ? Number(value) : value };
    state.state(stated, state.columns);
  }

  const columnOptions = sketch.columns.map(({ position, heading }) => ({
    value: String(position),
    name: heading ? `${position}: ${heading}` : `column ${position}`,
  }));
  const chooseColumn = (key: 'depth' | 'concentration', value: string): void => {
    const { [key]: _, ...rest } = state.columns;
    state.state(state.choice, value === '' ? rest : { ...rest, [key]: Number(value) });
  };

  return (
    <fieldset class="sheet-choices">
      <legend>How it was read</legend>
      {CHOICES.map(([key, label, options]) => (
        <Select
          key={key}
          label={label}
          value={String(state.choice[key] ?? '')}
          options={[{ value: '', name: `detected: ${detected(sketch, key, options)}` }, ...options]}
          choose={(value) => choose(key, value)}
        />
      ))}
      {(['depth', 'concentration'] as const).map((key) => (
        <Select
          key={key}
          label={key === 'depth' ? 'Depth column' : 'Concentration column'}
          value={String(state.columns[key] ?? '')}
          options={[{ value: '', name: `by the headings: ${columnsOf(sketch, key)}` }, ...columnOptions]}
          choose={(value) => chooseColumn(key, value)}
        />
      ))}
    </fieldset>
  );
}

function detected(sketch: TableSketch, key: keyof TableChoice, options: readonly Option[]): string {
  const value = sketch.choice[key];
  return nameOf(options, value === undefined ? undefined : String(value));
}

function columnsOf(sketch: TableSketch, role: 'depth' | 'concentration'): string {
  const own = sketch.columns.filter((column) => column.role === role);
  return own.map(({ heading, position }) => heading || `column ${position}`).join(', ') || 'none';
}
