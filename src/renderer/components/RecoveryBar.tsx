/** Offers unsaved work that an earlier session left behind. */

import { discard, leftBehind, restore } from '../state/recovery';

export function RecoveryBar() {
  const left = leftBehind.value;
  if (!left) return null;
  return (
    <section class="recovery" aria-label="Unsaved work">
      <p>
        Unsaved work on “{left.name}” from {new Date(left.savedAt).toLocaleString()}
      </p>
      <button type="button" class="button button-main" onClick={restore}>
        Restore
      </button>
      <button type="button" class="button" onClick={discard}>
        Discard
      </button>
    </section>
  );
}
