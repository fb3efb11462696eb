/** What is running: the program's version and the runtime in use, and what a prediction is not for. */

import { useEffect, useState } from 'preact/hooks';
import { PROGRAM_VERSION } from '../../core/index';
import type { RuntimeFacts } from '../../main/bridge';
import { bridge } from '../state/bridge';
import { panel } from '../state/viewState';
import { Dialog } from './Dialog';

export function About() {
  const [facts, setFacts] = useState<RuntimeFacts | null>(null);
  useEffect(() => {
    void bridge.runtimeFacts().then((outcome) => {
      if (outcome.ok) setFacts(outcome.value);
    });
  }, []);
  const rows = facts
    ? Object.entries({ Electron: facts.electron, Chromium: facts.chrome, Node: facts.node }).filter(
        ([, v]) => v,
      )
    : [];
  return (
    <Dialog
      title={`Ohmstrata ${PROGRAM_VERSION}`}
      onClose={() => {
        panel.value = null;
      }}
      class="dialog-small"
    >
      <p>
        Predicts what a doped layer in silicon will read electrically, from a recipe or a measured profile.
      </p>
      <p>
        A prediction is no measurement: do not release a lot on it alone. Work with dopant gases, acids,
        furnaces and live structures follows your site’s safety rules, local codes and qualified staff.
      </p>
      <dl class="figures">
        {rows.map(([name, value]) => (
          <>
            <dt>{name}</dt>
            <dd>{value}</dd>
          </>
        ))}
      </dl>
      {facts?.carriedRuntime && (
        <p class="card-note">
          This window runs on a stand-in runtime that came from a package registry. It is old: use it here, do
          not pass it on.
        </p>
      )}
    </Dialog>
  );
}
