/** The state of one import: what was stated about the table, what reading it gave, which profiles are wanted. */

import { useEffect, useRef, useState } from 'preact/hooks';
import type { Dopant, StudyStep, TableChoice } from '../../core/index';
import type { Outcome } from '../../main/bridge';
import { startTableReader, type TableReader } from './tableReader';
import type { ColumnChoice, TableSketch } from './tableWorker';

/** A profile as the person wants it, by the position of its concentration column. */
export interface Wanted {
  readonly on: boolean;
  readonly dopant: Dopant | null;
}

export interface TableState {
  readonly sketch: TableSketch | null;
  /** Why the table cannot be read or taken in. */
  readonly problem: string | null;
  readonly isBusy: boolean;
  readonly choice: TableChoice;
  readonly columns: ColumnChoice;
  readonly wanted: readonly Wanted[];
  state(choice: TableChoice, columns: ColumnChoice): void;
  want(profile: number, wanted: Wanted): void;
  /** The steps to add; null when the table cannot be taken in, which `problem` then explains. */
  embed(): Promise<StudyStep[] | null>;
}

export function useTable(table: { name: string; bytes: Uint8Array }): TableState {
  const reader = useRef<TableReader | null>(null);
  const newest = useRef(0);
  const [sketch, setSketch] = useState<TableSketch | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [isBusy, setBusy] = useState(true);
  const [stated, setStated] = useState<{ choice: TableChoice; columns: ColumnChoice }>({
    choice: {},
    columns: {},
  });
  const [wanted, setWanted] = useState<Wanted[]>([]);

  async function read(choice: TableChoice, columns: ColumnChoice): Promise<void> {
    const run = ++newest.current;
    setBusy(true);
    const outcome = await asOutcome(() => (reader.current as TableReader).tables.read(choice, columns));
    if (run !== newest.current) return;
    setBusy(false);
    setProblem(outcome.ok ? null : outcome.message);
    if (!outcome.ok) return;
    setSketch(outcome.value);
    setWanted(outcome.value.profiles.map(({ dopant }) => ({ on: true, dopant: dopant ?? null })));
  }

  useEffect(() => {
    reader.current = startTableReader();
    void reader.current.tables.hold(table.bytes, table.name);
    void read({}, {});
    return () => reader.current?.end();
  }, []);

  return {
    sketch,
    problem,
    isBusy,
    ...stated,
    wanted,
    state(choice, columns) {
      setStated({ choice, columns });
      void read(choice, columns);
    },
    want(profile, next) {
      setWanted(wanted.map((each, i) => (i === profile ? next : each)));
    },
    async embed() {
      const picks = wanted.flatMap(({ on, dopant }, profile) => (on && dopant ? [{ profile, dopant }] : []));
      const outcome = await asOutcome(() => (reader.current as TableReader).tables.embed(picks));
      if (outcome.ok) return outcome.value;
      setProblem(outcome.message);
      return null;
    },
  };
}

async function asOutcome<T>(run: () => Promise<Outcome<T>>): Promise<Outcome<T>> {
  try {
    return await run();
  } catch (error) {
    return {
      ok: false,
      message: `reading stopped: ${error instanceof Error ? error.message : String(error)}`,
    };
  }
}
