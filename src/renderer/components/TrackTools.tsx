/** How the tracks are looked at: depth unit, scale of concentrations, zoom, table. */

import { chosenWindow, concentrationScale, depthUnit, panel } from '../state/viewState';
import { DEPTH_UNIT_NAMES } from '../tracks/view';
import { IconButton } from './IconButton';
import { zoom } from './trackKeys';

export function TrackTools() {
  return (
    <div class="track-tools">
      <h2 class="pane-title">Tracks</h2>
      <Toggle
        name="Depth unit"
        options={(['um', 'nm'] as const).map((value) => ({ value, name: DEPTH_UNIT_NAMES[value] }))}
        chosen={depthUnit.value}
        choose={(value) => {
          depthUnit.value = value;
        }}
      />
      <Toggle
        name="Scale of concentrations"
        options={[
          { value: 'log', name: 'log' },
          { value: 'linear', name: 'linear' },
        ]}
        chosen={concentrationScale.value}
        choose={(value) => {
          concentrationScale.value = value;
        }}
      />
      <div class="bar-space" />
      <IconButton
        icon="zoomIn"
        name="Zoom in (+, wheel, or drag across the depths)"
        onClick={() => zoom(0.5)}
      />
      <IconButton icon="zoomOut" name="Zoom out (−)" onClick={() => zoom(2)} />
      <IconButton
        icon="reset"
        name="Reset the depth axis (0, or double click)"
        disabled={chosenWindow.value === null}
        onClick={() => {
          chosenWindow.value = null;
        }}
      />
      <IconButton
        icon="table"
        name="Show as table (T)"
        onClick={() => {
          panel.value = 'table';
        }}
      />
    </div>
  );
}

interface ToggleProps<T extends string> {
  name: string;
  options: readonly { value: T; name: string }[];
  chosen: T;
  choose: (value: T) => void;
}

function Toggle<T extends string>({ name, options, chosen, choose }: ToggleProps<T>) {
  return (
    <fieldset class="toggle" aria-label={name}>
      {options.map((option) => (
        <button
          key={option.value}
          type="button"
          aria-pressed={option.value === chosen}
          onClick={() => choose(option.value)}
        >
          {option.name}
        </button>
      ))}
    </fieldset>
  );
}
