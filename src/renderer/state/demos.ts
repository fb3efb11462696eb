/** The demo studies that come with the program; their data are invented. */

const FILES = import.meta.glob<string>('../../../demo-profiles/*.json', {
  query: '?raw',
  import: 'default',
  eager: true,
});

export interface Demo {
  readonly fileName: string;
  readonly name: string;
  /** The first sentence of the study's own note. */
  readonly note: string;
  readonly text: string;
}

const FIRST = 'p-resistor.json';

/** The one of the first start leads. */
export const DEMOS: readonly Demo[] = Object.entries(FILES)
  .map(([path, text]) => {
    const fileName = path.slice(path.lastIndexOf('/') + 1);
    const { name, note = '' } = JSON.parse(text) as { name?: string; note?: string };
    return { fileName, name: name ?? fileName, note: note.split(/(?<=[.:;])\s/)[0], text };
  })
  .sort(
    (a, b) => Number(b.fileName === FIRST) - Number(a.fileName === FIRST) || a.name.localeCompare(b.name),
  );
