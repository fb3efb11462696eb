/** The wafer everything begins with: background doping stated as concentration or resistivity, and what ends the film. */

import { concentrationOf, DOPANT_FACTS, formatQuantity, resistivityOf } from '../../core/index';
import { digits } from '../state/digits';
import { withStudy } from '../state/draft';
import { shown } from '../state/solver';
import { DOPANT_OPTIONS } from '../state/stepFields';
import { edit, study } from '../state/studySession';
import { Card } from './Card';
import { ChoiceField } from './ChoiceField';
import { QuantityField } from './QuantityField';

type Wafer = (typeof study.value)['wafer'];

function setWafer(label: string, wafer: Wafer): void {
  edit(label, (draft) => withStudy(draft, { ...draft.study, wafer }));
}

const rounded = (value: number): number => Number(value.toPrecision(4));

/** The same doping stated the other way, by the published relation of both. */
function statedBy(wafer: Wafer, key: string): Wafer {
  const { concentration_cm3: concentration, resistivity_ohmCm: resistivity, ...rest } = wafer;
  if (key === 'resistivity' && concentration !== undefined)
    return { ...rest, resistivity_ohmCm: rounded(resistivityOf(wafer.dopant, concentration).value) };
  if (key === 'concentration' && resistivity !== undefined)
    return { ...rest, concentration_cm3: rounded(concentrationOf(wafer.dopant, resistivity).value) };
  return wafer;
}

function summaryOf(wafer: Wafer): string {
  const { symbol, role } = DOPANT_FACTS[wafer.dopant];
  const amount =
    wafer.concentration_cm3 === undefined
      ? `${wafer.resistivity_ohmCm} Ω cm`
      : `${formatQuantity(wafer.concentration_cm3, 'concentration')} cm⁻³`;
  return `${role === 'donor' ? 'n' : 'p'}, ${symbol} ${amount}`;
}

export function WaferCard() {
  const { wafer } = study.value;
  const byResistivity = wafer.resistivity_ohmCm !== undefined;
  return (
    <Card title="Wafer" summary={summaryOf(wafer)}>
      <ChoiceField
        path="wafer.dopant"
        label="Dopant"
        options={DOPANT_OPTIONS}
        chosen={wafer.dopant}
        choose={(dopant) => setWafer('wafer dopant', { ...wafer, dopant: dopant as Wafer['dopant'] })}
      />
      <ChoiceField
        path="wafer"
        label="Stated by"
        options={[
          { value: 'concentration', name: 'concentration' },
          { value: 'resistivity', name: 'resistivity' },
        ]}
        chosen={byResistivity ? 'resistivity' : 'concentration'}
        choose={(key) => setWafer('how the wafer is stated', statedBy(wafer, key))}
      />
      {byResistivity ? (
        <QuantityField
          path="wafer.resistivity_ohmCm"
          label="Resistivity"
          unit="ohm cm"
          undoName="wafer resistivity"
        />
      ) : (
        <QuantityField
          path="wafer.concentration_cm3"
          label="Concentration"
          unit="cm-3"
          undoName="wafer concentration"
        />
      )}
      <QuantityField path="wafer.thickness_um" label="Thickness" unit="um" undoName="wafer thickness" />
      <QuantityField
        path="wafer.buriedOxide_um"
        label="Buried oxide"
        unit="um"
        whenEmpty="none"
        undoName="buried oxide depth"
      />
      <ChoiceField
        path="wafer.orientation"
        label="Orientation"
        options={[
          { value: '100', name: '(100)' },
          { value: '111', name: '(111)' },
        ]}
        chosen={wafer.orientation}
        choose={(orientation) =>
          setWafer('wafer orientation', { ...wafer, orientation: orientation as Wafer['orientation'] })
        }
      />
      <Resistivities />
    </Card>
  );
}

/** The wafer's resistivity by the standard and by the study's own mobility model, which need not agree. */
function Resistivities() {
  const result = shown.value?.solution.result;
  if (!result) return null;
  const { wafer, models, temperature_C } = result;
  return (
    <p class="card-note">
      {digits(wafer.concentration_cm3)} cm⁻³ is {digits(wafer.resistivity_ohmCm)} Ω cm by SEMI MF723 at 23 °C,{' '}
      {digits(wafer.modelResistivity_ohmCm)} Ω cm by {models.mobility} at {temperature_C} °C.
    </p>
  );
}
