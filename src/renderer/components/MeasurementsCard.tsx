/** Four-point values that were measured on layers, to stand beside the predicted ones. */

import type { Measurement } from '../../core/index';
import { withStudy } from '../state/draft';
import { shown } from '../state/solver';
import { edit, study } from '../state/studySession';
import { Card } from './Card';
import { ChoiceField } from './ChoiceField';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import { QuantityField } from './QuantityField';

function setMeasurements(label: string, measurements: Measurement[]): void {
  edit(label, (draft) => {
    const { measurements: _, ...rest } = draft.study;
    return withStudy(draft, measurements.length > 0 ? { ...rest, measurements } : rest);
  });
}

export function MeasurementsCard() {
  const measurements = study.value.measurements ?? [];
  const layers = shown.value?.solution.result.layers ?? [];

  function add(): void {
    const predicted = layers[0]?.sheetResistance_ohmSq ?? 1000;
    const fresh = {
      kind: 'fourPoint' as const,
      layer: 1,
      sheetResistance_ohmSq: Number(predicted.toPrecision(3)),
    };
    setMeasurements('adding a measured value', [...measurements, fresh]);
  }

  const summary = measurements.length === 0 ? 'none' : `${measurements.length} four-point`;
  return (
    <Card title="Measured" summary={summary}>
      {measurements.map((measurement, i) => (
        <fieldset class="measured" key={i}>
          <legend>
            Value {i + 1}
            <IconButton
              icon="close"
              name={`Remove measured value ${i + 1}`}
              onClick={() =>
                setMeasurements(
                  'removing a measured value',
                  measurements.filter((_, other) => other !== i),
                )
              }
            />
          </legend>
          <ChoiceField
            path={`measurements[${i}].layer`}
            label="Layer"
            options={layerOptions(Math.max(layers.length, measurement.layer))}
            chosen={String(measurement.layer)}
            choose={(layer) =>
              setMeasurements(
                'layer of a measured value',
                measurements.map((each, other) => (other === i ? { ...each, layer: Number(layer) } : each)),
              )
            }
          />
          <QuantityField
            path={`measurements[${i}].sheetResistance_ohmSq`}
            label="Four-point"
            unit="ohm/sq"
            undoName="measured sheet resistance"
          />
          <QuantityField
            path={`measurements[${i}].sigma_ohmSq`}
            label="Uncertainty"
            unit="ohm/sq"
            whenEmpty="not stated"
            undoName="uncertainty of a measured value"
          />
        </fieldset>
      ))}
      <button type="button" class="button button-wide" onClick={add}>
        <Icon name="plus" /> Add a measured value
      </button>
    </Card>
  );
}

const layerOptions = (count: number): { value: string; name: string }[] =>
  Array.from({ length: count }, (_, i) => ({ value: String(i + 1), name: `layer ${i + 1}` }));
