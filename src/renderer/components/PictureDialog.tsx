/** Asks how large a picture of the tracks is to be. */

import { useId, useState } from 'preact/hooks';
import { exportPicture } from '../state/exports';
import { panel, pictureFormat } from '../state/viewState';
import { Dialog } from './Dialog';

const SIZES = [
  { value: '1600x1200', name: '1600 × 1200, page' },
  { value: '1200x1200', name: '1200 × 1200, square' },
  { value: '1920x1080', name: '1920 × 1080, slide' },
  { value: '800x1000', name: '800 × 1000, one column' },
] as const;
const SCALES = [1, 2, 3] as const;

const close = (): void => {
  panel.value = null;
};

export function PictureDialog() {
  const id = useId();
  const [size, setSize] = useState<string>(SIZES[0].value);
  const [scale, setScale] = useState(2);
  const format = pictureFormat.value;

  function run(event: Event): void {
    event.preventDefault();
    const [width, height] = size.split('x').map(Number);
    close();
    void exportPicture({ format, width, height, scale: format === 'png' ? scale : 1 });
  }

  return (
    <Dialog title={`Export tracks as ${format.toUpperCase()}`} onClose={close} class="dialog-small">
      <form onSubmit={run}>
        <div class="field">
          <label for={`${id}-size`}>Size</label>
          <div class="field-box">
            <select id={`${id}-size`} value={size} onChange={(event) => setSize(event.currentTarget.value)}>
              {SIZES.map(({ value, name }) => (
                <option key={value} value={value}>
                  {name}
                </option>
              ))}
            </select>
          </div>
        </div>
        {format === 'png' && (
          <div class="field">
            <label for={`${id}-scale`}>Sharpness</label>
            <div class="field-box">
              <select
                id={`${id}-scale`}
                value={String(scale)}
                onChange={(event) => setScale(Number(event.currentTarget.value))}
              >
                {SCALES.map((value) => (
                  <option key={value} value={String(value)}>
                    {value} × as many pixels
                  </option>
                ))}
              </select>
            </div>
          </div>
        )}
        <p class="card-note">On white, with study, fingerprint, model and version in one line below.</p>
        <div class="dialog-buttons">
          <button type="submit" class="button button-main">
            Export
          </button>
          <button type="button" class="button" onClick={close}>
            Cancel
          </button>
        </div>
      </form>
    </Dialog>
  );
}
