/** Which published models the study is solved with, and the temperature of the reading. */

import { DOPANT_FACTS, MOBILITY_MODELS, type Study } from '../../core/index';
import { withStudy } from '../state/draft';
import {
  CARRIER_OPTIONS,
  DIFFUSION_OPTIONS,
  IONISATION_OPTIONS,
  NARROWING_OPTIONS,
  STATISTICS_OPTIONS,
} from '../state/modelOptions';
import { DIFFUSIVITY_OPTIONS, RANGE_OPTIONS } from '../state/stepFields';
import { edit, shownDopants, study } from '../state/studySession';
import { Card } from './Card';
import { ChoiceField } from './ChoiceField';
import { QuantityField } from './QuantityField';

type Models = Study['models'];

function setModel<K extends keyof Models>(key: K, label: string, value: Models[K]): void {
  edit(label, (draft) =>
    withStudy(draft, { ...draft.study, models: { ...draft.study.models, [key]: value } }),
  );
}

export function ModelsCard() {
  const { models, temperature_C } = study.value;
  const model = MOBILITY_MODELS.find((each) => each.name === models.mobility);
  const perDopant = typeof models.activation === 'object';
  return (
    <Card title="Models" summary={`${model?.title ?? models.mobility}, ${temperature_C} °C`}>
      <QuantityField path="temperature_C" label="Read at" unit="C" undoName="temperature of the reading" />
      <ChoiceField
        path="models.mobility"
        label="Mobility"
        options={MOBILITY_MODELS.map(({ name, title }) => ({ value: name, name: title }))}
        chosen={models.mobility}
        choose={(name) => setModel('mobility', 'mobility model', name as Models['mobility'])}
      />
      <ChoiceField
        path="models.carriers"
        label="Carriers"
        options={CARRIER_OPTIONS}
        chosen={models.carriers}
        choose={(name) => setModel('carriers', 'how carriers are found', name as Models['carriers'])}
      />
      <ChoiceField
        path="models.ionisation"
        label="Ionisation"
        options={IONISATION_OPTIONS}
        chosen={models.ionisation}
        choose={(name) => setModel('ionisation', 'ionisation', name as Models['ionisation'])}
      />
      <ChoiceField
        path="models.activation"
        label="Activation"
        options={[
          { value: 'full', name: 'all active' },
          { value: 'solubility', name: 'up to solubility' },
          { value: 'fractions', name: 'fraction per dopant' },
        ]}
        chosen={perDopant ? 'fractions' : (models.activation as string)}
        choose={(choice) =>
          setModel(
            'activation',
            'activation',
            choice === 'fractions'
              ? Object.fromEntries(shownDopants.value.map((dopant) => [dopant, 1]))
              : (choice as 'full' | 'solubility'),
          )
        }
      />
      {perDopant &&
        shownDopants.value.map((dopant) => (
          <QuantityField
            key={dopant}
            path={`models.activation.${dopant}`}
            label={`${DOPANT_FACTS[dopant].symbol} active`}
            unit="fraction"
            whenEmpty="1"
            undoName={`active fraction of ${dopant}`}
          />
        ))}
      <ChoiceField
        path="models.ranges"
        label="Ion ranges"
        options={RANGE_OPTIONS}
        chosen={models.ranges}
        choose={(name) => setModel('ranges', 'ion ranges', name as Models['ranges'])}
      />
      <ChoiceField
        path="models.diffusion"
        label="Diffusion"
        options={DIFFUSION_OPTIONS}
        chosen={models.diffusion}
        choose={(name) => setModel('diffusion', 'how diffusion is computed', name as Models['diffusion'])}
      />
      <ChoiceField
        path="models.diffusivity"
        label="Diffusivity"
        options={DIFFUSIVITY_OPTIONS}
        chosen={models.diffusivity}
        choose={(name) => setModel('diffusivity', 'diffusivities', name as Models['diffusivity'])}
      />
      <ChoiceField
        path="models.statistics"
        label="Statistics"
        options={STATISTICS_OPTIONS}
        chosen={models.statistics}
        choose={(name) => setModel('statistics', 'carrier statistics', name as Models['statistics'])}
      />
      <ChoiceField
        path="models.narrowing"
        label="Narrowing"
        options={NARROWING_OPTIONS}
        chosen={models.narrowing}
        choose={(name) => setModel('narrowing', 'band-gap narrowing', name as Models['narrowing'])}
      />
      {model && <p class="card-note">{model.source}</p>}
    </Card>
  );
}
