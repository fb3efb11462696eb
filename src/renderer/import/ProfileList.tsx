/** The profiles found in a table: which to take, as which dopant, and a small picture of each. */

import type { Dopant } from '../../core/index';
import { digits } from '../state/digits';
import { DOPANT_OPTIONS } from '../state/stepFields';
import type { ProfileSketch, TableSketch } from './tableWorker';
import { thumbnailPath } from './thumbnail';
import type { TableState } from './useTable';

interface Props {
  state: TableState;
  sketch: TableSketch;
}

export function ProfileList({ state, sketch }: Props) {
  return (
    <ul class="profiles" aria-label="Profiles found">
      {sketch.profiles.map((profile, i) => {
        const wanted = state.wanted[i];
        if (!wanted) return null;
        const name = profile.heading || `profile ${i + 1}`;
        return (
          <li key={name} class={`profile ${wanted.on ? '' : 'profile-off'}`}>
            <label class="profile-name">
              <input
                type="checkbox"
                checked={wanted.on}
                onChange={(event) => state.want(i, { ...wanted, on: event.currentTarget.checked })}
              />
              <span title={name}>{name}</span>
            </label>
            <Thumbnail profile={profile} />
            <select
              aria-label={`Dopant of ${name}`}
              value={wanted.dopant ?? ''}
              onChange={(event) =>
                state.want(i, { ...wanted, dopant: (event.currentTarget.value || null) as Dopant | null })
              }
            >
              <option value="" selected={wanted.dopant === null}>
                which dopant?
              </option>
              {DOPANT_OPTIONS.map((option) => (
                <option key={option.value} value={option.value} selected={option.value === wanted.dopant}>
                  {option.name}
                </option>
              ))}
            </select>
            <p class="card-note">
              {profile.points.toLocaleString('en')} points to {digits(profile.deepest_um)} µm, peak{' '}
              {digits(profile.peak_cm3, 3)} cm⁻³
              {profile.belowDetection > 0 && `, ${profile.belowDetection} rows below detection left out`}
            </p>
          </li>
        );
      })}
    </ul>
  );
}

const WIDTH = 148;
const HEIGHT = 56;

function Thumbnail({ profile }: { profile: ProfileSketch }) {
  return (
    <svg class="thumbnail" viewBox={`0 0 ${WIDTH} ${HEIGHT}`} width={WIDTH} height={HEIGHT} role="img">
      <title>Concentration (log) against depth</title>
      <path d={thumbnailPath(profile.depth_um, profile.concentration_cm3, WIDTH, HEIGHT)} />
    </svg>
  );
}
