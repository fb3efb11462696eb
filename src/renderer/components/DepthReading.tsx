/** The line of values at the crosshair's depth; its samples of line and colour are the tracks' legend as well. */

import { useEffect, useState } from 'preact/hooks';
import { digits } from '../state/digits';
import { shown } from '../state/solver';
import { crosshair_um, depthUnit, theme } from '../state/viewState';
import { type Curve, trackCurves } from '../tracks/curves';
import { PALETTES } from '../tracks/palette';
import { depthText, readAt } from '../tracks/reading';
import { crosshairText } from './trackKeys';

const SPEAK_AFTER_MS = 400;

export function DepthReading() {
  const columns = shown.value?.solution.columns;
  const at = crosshair_um.value;
  if (!columns) return <div class="depth-reading" />;
  const curves = trackCurves(columns, PALETTES[theme.value], depthUnit.value);
  const values = new Map(
    at === null ? [] : readAt(columns, curves, at).map(({ curve, value }) => [curve.key, value]),
  );
  return (
    <div class="depth-reading">
      <span class="reading-depth">{at === null ? 'point at a depth' : depthText(at, depthUnit.value)}</span>
      {curves.map((curve) => (
        <span key={curve.key} class="reading" title={curve.longName}>
          <Sample curve={curve} />
          <span class="reading-name">{curve.name}</span>
          {at !== null && (
            <span class="reading-value">
              {digits(values.get(curve.key) ?? Number.NaN, 3)} <span class="unit">{curve.unit}</span>
            </span>
          )}
        </span>
      ))}
      <Spoken />
    </div>
  );
}

function Sample({ curve }: { curve: Curve }) {
  const dash = curve.dash === 'solid' ? undefined : curve.dash.replace(/px/g, '');
  return (
    <svg class="sample" width="26" height="8" aria-hidden="true">
      <line
        x1="0"
        x2="26"
        y1="4"
        y2="4"
        stroke={curve.colour}
        stroke-width={curve.width}
        stroke-dasharray={dash}
      />
    </svg>
  );
}

/** Says the values once the crosshair rests. */
function Spoken() {
  const [text, setText] = useState('');
  const at = crosshair_um.value;
  useEffect(() => {
    const timer = setTimeout(() => setText(crosshairText() ?? ''), SPEAK_AFTER_MS);
    return () => clearTimeout(timer);
  }, [at]);
  return (
    <span class="visually-hidden" aria-live="polite">
      {text}
    </span>
  );
}
