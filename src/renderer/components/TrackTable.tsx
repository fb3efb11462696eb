/** The tracks as a table: the same numbers, at depths spread over what the tracks show. */

import { digits } from '../state/digits';
import { exportColumns } from '../state/exports';
import { shown } from '../state/solver';
import { depthUnit, depthWindow, panel, theme } from '../state/viewState';
import { trackCurves } from '../tracks/curves';
import { valueAtDepth } from '../tracks/interpolate';
import { PALETTES } from '../tracks/palette';
import { DEPTH_UNIT_NAMES, PER_UM } from '../tracks/view';
import { Dialog } from './Dialog';

const ROWS = 41;

const close = (): void => {
  panel.value = null;
};

export function TrackTable() {
  const current = shown.value;
  const window = depthWindow.value;
  if (!current || !window) return null;
  const { columns } = current.solution;
  const unit = depthUnit.value;
  const curves = trackCurves(columns, PALETTES[theme.value], unit);
  const depths = Array.from(
    { length: ROWS },
    (_, i) => window.from_um + (i / (ROWS - 1)) * (window.to_um - window.from_um),
  );
  return (
    <Dialog title="Tracks as a table" onClose={close} class="dialog-wide">
      <p class="card-note">
        {ROWS} depths of what the tracks show. Every node of the depth mesh:{' '}
        <button type="button" class="link" onClick={() => void exportColumns()}>
          export columns
        </button>
        .
      </p>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard. */}
      <section class="table-scroll" tabIndex={0} aria-label="Values against depth">
        <table class="data-table">
          <thead>
            <tr>
              <th scope="col">depth ({DEPTH_UNIT_NAMES[unit]})</th>
              {curves.map((curve) => (
                <th key={curve.key} scope="col">
                  {curve.longName} ({curve.unit})
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {depths.map((depth) => (
              <tr key={depth}>
                <th scope="row">{(depth * PER_UM[unit]).toPrecision(4)}</th>
                {curves.map((curve) => (
                  <td key={curve.key}>
                    {digits(valueAtDepth(columns.depth_um, curve.values, depth, curve.unit === 'cm⁻³'))}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </section>
    </Dialog>
  );
}
