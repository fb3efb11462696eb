/** What acts on the carriers from outside: the surface, and reverse voltages of the junctions. */

import type { Study } from '../../core/index';
import { withStudy } from '../state/draft';
import { shown } from '../state/solver';
import { edit, study } from '../state/studySession';
import { Card } from './Card';
import { ChoiceField } from './ChoiceField';
import { Icon } from './Icon';
import { QuantityField } from './QuantityField';

type Surface = Study['surface'];
type SurfaceKind = 'none' | 'charge' | 'potential';

const SURFACES: Record<SurfaceKind, { readonly name: string; readonly fresh: Surface }> = {
  none: { name: 'no field', fresh: undefined },
  charge: { name: 'fixed oxide charge', fresh: { charge_cm2: 1e11 } },
  potential: { name: 'stated potential', fresh: { potential_V: 0 } },
};

const kindOf = (surface: Surface): SurfaceKind =>
  surface === undefined ? 'none' : surface.charge_cm2 === undefined ? 'potential' : 'charge';

function setKey<K extends 'surface' | 'reverseBias_V'>(key: K, label: string, value: Study[K]): void {
  edit(label, (draft) => {
    const changed = { ...draft.study, [key]: value };
    if (value === undefined) delete changed[key];
    return withStudy(draft, changed);
  });
}

export function SurroundingsCard() {
  const { surface, reverseBias_V: bias } = study.value;
  const kind = kindOf(surface);
  const summary = [kind === 'none' ? 'no surface field' : SURFACES[kind].name, ...(bias ? ['biased'] : [])];
  return (
    <Card title="Surface and bias" summary={summary.join(', ')}>
      <ChoiceField
        path="surface"
        label="Surface"
        options={Object.entries(SURFACES).map(([value, { name }]) => ({ value, name }))}
        chosen={kind}
        choose={(choice) => setKey('surface', 'surface', SURFACES[choice as SurfaceKind].fresh)}
      />
      {kind === 'charge' && (
        <QuantityField path="surface.charge_cm2" label="Charge" unit="cm-2" undoName="surface charge" />
      )}
      {kind === 'potential' && (
        <QuantityField path="surface.potential_V" label="Potential" unit="V" undoName="surface potential" />
      )}
      {bias ? <Voltages bias={bias} /> : <AddVoltages />}
    </Card>
  );
}

function Voltages({ bias }: { bias: readonly number[] }) {
  return (
    <>
      {bias.map((_, k) => (
        <QuantityField
          key={k}
          path={`reverseBias_V[${k}]`}
          label={`Junction ${k + 1}, reverse`}
          unit="V"
          undoName={`voltage of junction ${k + 1}`}
        />
      ))}
      <button
        type="button"
        class="button button-wide"
        onClick={() => setKey('reverseBias_V', 'removing the voltages', undefined)}
      >
        <Icon name="close" /> Remove the voltages
      </button>
    </>
  );
}

function AddVoltages() {
  const junctions = (shown.value?.solution.result.junctions ?? []).filter(
    ({ metallurgical_um }) => metallurgical_um !== null,
  );
  return (
    <button
      type="button"
      class="button button-wide"
      disabled={junctions.length === 0}
      onClick={() =>
        setKey(
          'reverseBias_V',
          'adding reverse voltages',
          junctions.map(() => 0),
        )
      }
    >
      <Icon name="plus" /> Reverse voltages
    </button>
  );
}
