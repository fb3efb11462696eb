/** The window's icons: strokes on a 16 pixel grid, drawn in the colour of the text. */

const PATHS = {
  undo: 'M6 3 2.5 6.5 6 10M2.5 6.5H10a3.5 3.5 0 0 1 0 7H7',
  redo: 'M10 3l3.5 3.5L10 10M13.5 6.5H6a3.5 3.5 0 0 0 0 7h3',
  grip: 'M6 3.5v.01M10 3.5v.01M6 8v.01M10 8v.01M6 12.5v.01M10 12.5v.01',
  up: 'M8 12.5v-9M4 7.5l4-4 4 4',
  down: 'M8 3.5v9M4 8.5l4 4 4-4',
  plus: 'M8 3v10M3 8h10',
  close: 'M4 4l8 8M12 4l-8 8',
  copy: 'M5.5 5.5h7.5v7.5H5.5zM3 10.5V3h7.5',
  eye: 'M1.5 8S4 3.5 8 3.5 14.5 8 14.5 8 12 12.5 8 12.5 1.5 8 1.5 8zM8 6.2a1.8 1.8 0 1 0 .01 0',
  eyeOff: 'M1.5 8S4 3.5 8 3.5 14.5 8 14.5 8 12 12.5 8 12.5 1.5 8 1.5 8zM2.5 13.5l11-11',
  chevron: 'M6 4l4 4-4 4',
  search: 'M7 2.5a4.5 4.5 0 1 0 .01 0M10.5 10.5 14 14',
  zoomIn: 'M7 2.5a4.5 4.5 0 1 0 .01 0M10.5 10.5 14 14M5 7h4M7 5v4',
  zoomOut: 'M7 2.5a4.5 4.5 0 1 0 .01 0M10.5 10.5 14 14M5 7h4',
  reset: 'M2.5 5.5v-3h3M13.5 5.5v-3h-3M2.5 10.5v3h3M13.5 10.5v3h-3',
  table: 'M2.5 3h11v10h-11zM2.5 6.3h11M2.5 9.6h11M6.2 3v10',
  warning: 'M8 2.2 14.5 13.5h-13zM8 6.5v3.4M8 11.8v.01',
  info: 'M8 1.8a6.2 6.2 0 1 0 .01 0M8 7.2v4M8 4.8v.01',
  menu: 'M4 6.5l4 4 4-4',
} as const;

export type IconName = keyof typeof PATHS;

export function Icon({ name }: { name: IconName }) {
  return (
    <svg class="icon" viewBox="0 0 16 16" width="16" height="16" aria-hidden="true">
      <path d={PATHS[name]} />
    </svg>
  );
}
