/** The tracks as a picture for paper: always on white, with one line that says where it came from. */

import type { Solution } from '../../core/index';
import type { DepthWindow } from './depthWindow';
import { buildFigure } from './figure';
import { plotly } from './plotly';
import type { TrackView } from './view';

interface Request {
  readonly format: 'svg' | 'png';
  readonly width: number;
  readonly height: number;
  readonly scale: number;
}

/** Fonts that a viewer of the file has: the window's own is not embedded. */
const PRINT_FONT = 'Helvetica, Arial, sans-serif';

/** Text of an SVG, bytes of a PNG. */
export async function pictureOf(
  solution: Solution,
  view: Pick<TrackView, 'depthUnit' | 'scale'>,
  window: DepthWindow,
  { format, width, height, scale }: Request,
  caption: string,
): Promise<string | Uint8Array> {
  const fontSize = Math.max(10, Math.round(height / 75));
  const print: TrackView = { ...view, theme: 'light', font: PRINT_FONT, fontSize };
  const { data, layout } = buildFigure(solution, print, window, { width, height });
  const captioned = { ...layout, annotations: [...layout.annotations, captionLine(caption, fontSize)] };
  const library = await plotly();
  const url = await library.toImage({ data, layout: captioned }, { format, width, height, scale });
  if (format === 'svg') return decodeURIComponent(url.slice(url.indexOf(',') + 1));
  return Uint8Array.from(atob(url.slice(url.indexOf(',') + 1)), (sign) => sign.charCodeAt(0));
}

const captionLine = (text: string, fontSize: number): object => ({
  xref: 'paper',
  yref: 'paper',
  x: 1,
  y: 0,
  xanchor: 'right',
  yanchor: 'top',
  yshift: -2 * fontSize,
  text: text.replace(/[<>&]/g, ' '),
  showarrow: false,
  font: { size: fontSize * 0.75, color: '#56606b' },
});
