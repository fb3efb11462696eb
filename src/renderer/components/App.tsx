/** The window: recipe at the left, tracks in the middle, readings at the right, between the bar and the status line. */

import { useState } from 'preact/hooks';
import { ImportSheet } from '../import/ImportSheet';
import { importing, takeDropped } from '../state/files';
import { panel } from '../state/viewState';
import { About } from './About';
import { CommandSearch } from './CommandSearch';
import { PictureDialog } from './PictureDialog';
import { OpenQuestion } from './QuestionDialog';
import { Readings } from './Readings';
import { Recipe } from './Recipe';
import { RecoveryBar } from './RecoveryBar';
import { StatusBar } from './StatusBar';
import { TopBar } from './TopBar';
import { Tracks } from './Tracks';
import { TrackTable } from './TrackTable';

const bringsFiles = (event: DragEvent): boolean => event.dataTransfer?.types.includes('Files') ?? false;

export function App() {
  const [over, setOver] = useState(false);
  return (
    <div
      class="window"
      role="presentation"
      onDragOver={(event) => {
        if (!bringsFiles(event)) return;
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={(event) => {
        if (event.relatedTarget === null) setOver(false);
      }}
      onDrop={(event) => {
        if (!bringsFiles(event)) return;
        event.preventDefault();
        setOver(false);
        void takeDropped((event.dataTransfer as DataTransfer).files);
      }}
    >
      <TopBar />
      <RecoveryBar />
      <Recipe />
      <main class="middle" aria-label="Tracks">
        <Tracks />
        {importing.value && <ImportSheet key={importing.value} table={importing.value} />}
      </main>
      <Readings />
      <StatusBar />
      {panel.value === 'commands' && <CommandSearch />}
      {panel.value === 'table' && <TrackTable />}
      {panel.value === 'about' && <About />}
      {panel.value === 'picture' && <PictureDialog />}
      <OpenQuestion />
      {over && <div class="drop-here">Drop a study (.json) or a table (.csv, .txt)</div>}
    </div>
  );
}
