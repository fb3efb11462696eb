/** The window: recipe at the left, tracks in the middle, readings at the right, between the bar and the status line. */

import { ImportSheet } from '../import/ImportSheet';
import { importing, takeDropped } from '../state/files';
import { panel, VIEW_NAMES, view } from '../state/viewState';
import { About } from './About';
import { BiasView } from './BiasView';
import { CommandSearch } from './CommandSearch';
import { HistoryView } from './HistoryView';
import { PictureDialog } from './PictureDialog';
import { OpenQuestion } from './QuestionDialog';
import { Readings } from './Readings';
import { Recipe } from './Recipe';
import { RecoveryBar } from './RecoveryBar';
import { StatusBar } from './StatusBar';
import { TemperatureView } from './TemperatureView';
import { TopBar } from './TopBar';
import { Tracks } from './Tracks';
import { TrackTable } from './TrackTable';
import { useDroppedFiles } from './useDroppedFiles';

export function App() {
  const isOver = useDroppedFiles((files) => void takeDropped(files));
  return (
    <div class="window">
      <TopBar />
      <RecoveryBar />
      <Recipe />
      <main class="middle" aria-label={VIEW_NAMES[view.value]}>
        {view.value === 'tracks' && <Tracks />}
        {view.value === 'history' && <HistoryView />}
        {view.value === 'temperature' && <TemperatureView />}
        {view.value === 'bias' && <BiasView />}
        {importing.value && <ImportSheet key={importing.value} table={importing.value} />}
      </main>
      <Readings />
      <StatusBar />
      {panel.value === 'commands' && <CommandSearch />}
      {panel.value === 'table' && <TrackTable />}
      {panel.value === 'about' && <About />}
      {panel.value === 'picture' && <PictureDialog />}
      <OpenQuestion />
      {isOver && <div class="drop-here">Drop a study (.json) or a table (.csv, .txt)</div>}
    </div>
  );
}
