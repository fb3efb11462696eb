/** The recipe as the wafer sees it, from the top down: wafer, numbered steps, models, measurements. */

import { useEffect, useRef, useState } from 'preact/hooks';
import { importTable } from '../state/files';
import { add, move } from '../state/stepActions';
import { STEP_KINDS, STEP_ORDER } from '../state/stepKinds';
import { draft } from '../state/studySession';
import { focusRequest } from '../state/viewState';
import { Icon } from './Icon';
import { MeasurementsCard } from './MeasurementsCard';
import { Menu, type MenuItem } from './Menu';
import { ModelsCard } from './ModelsCard';
import { StepCard } from './StepCard';
import { SurroundingsCard } from './SurroundingsCard';
import { WaferCard } from './WaferCard';

export function Recipe() {
  return (
    <nav class="recipe" aria-label="Recipe">
      <h2 class="pane-title">Recipe</h2>
      <WaferCard />
      <Steps />
      <AddStep />
      <ModelsCard />
      <SurroundingsCard />
      <MeasurementsCard />
    </nav>
  );
}

function Steps() {
  const { study, stepIds } = draft.value;
  /** The step being dragged, and the gap it would go to: before the step at that position. */
  const [grabbed, setGrabbed] = useState<number | null>(null);
  const [gap, setGap] = useState<number | null>(null);
  const list = useRef<HTMLOListElement>(null);

  function gapAt(y: number): number {
    const cards = [...(list.current?.children ?? [])];
    const below = cards.findIndex((card) => {
      const { top, height } = card.getBoundingClientRect();
      return y < top + height / 2;
    });
    return below < 0 ? cards.length : below;
  }

  function onDragOver(event: DragEvent): void {
    if (grabbed === null) return;
    event.preventDefault();
    setGap(gapAt(event.clientY));
  }

  function onDrop(event: DragEvent): void {
    if (grabbed === null) return;
    event.preventDefault();
    const from = stepIds.indexOf(grabbed);
    const to = gapAt(event.clientY);
    move(from, to > from ? to - 1 : to);
  }

  return (
    <ol
      class={`steps ${gap === stepIds.length ? 'gap-end' : ''}`}
      aria-label="Steps"
      ref={list}
      onDragOver={onDragOver}
      onDrop={onDrop}
    >
      {study.steps.map((step, at) => (
        <StepCard
          key={stepIds[at]}
          id={stepIds[at]}
          step={step}
          at={at}
          isGap={gap === at}
          onGrab={(id) => {
            setGrabbed(id);
            setGap(null);
          }}
        />
      ))}
    </ol>
  );
}

function AddStep() {
  const root = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (focusRequest.value !== 'add') return;
    focusRequest.value = null;
    root.current?.querySelector('button')?.focus();
  }, [focusRequest.value]);
  const items = STEP_ORDER.map((kind): MenuItem => {
    const { title, what, fresh } = STEP_KINDS[kind];
    return {
      name: title,
      note: what,
      heading: kind === 'implant' ? 'Process' : kind === 'table' ? 'Profiles' : undefined,
      run: () => (fresh ? add(fresh) : void importTable()),
    };
  });
  return (
    <div class="add-step" ref={root}>
      <Menu
        label={
          <>
            <Icon name="plus" /> Add a step
          </>
        }
        items={items}
      />
    </div>
  );
}
