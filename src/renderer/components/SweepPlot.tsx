/** A figure of lines that is drawn anew when its lines, its size or the theme change. */

import { useEffect, useRef } from 'preact/hooks';
import { theme } from '../state/viewState';
import { plotly } from '../tracks/plotly';
import { buildSweepFigure, type SweepFigure } from '../tracks/sweepFigure';
import { WINDOW_FONT } from '../tracks/view';
import { useSize } from './useSize';

interface Props extends SweepFigure {
  /** What it shows, for those who cannot see it; the table below has the values. */
  label: string;
}

export function SweepPlot({ label, ...figure }: Props) {
  const plot = useRef<HTMLDivElement>(null);
  const size = useSize(plot);
  const shade = theme.value;
  useEffect(() => {
    if (!size) return;
    let isOld = false;
    void plotly().then((library) => {
      if (isOld || !plot.current) return;
      const { data, layout } = buildSweepFigure(figure, shade, WINDOW_FONT, size);
      return library.react(plot.current, data, layout, { displayModeBar: false });
    });
    return () => {
      isOld = true;
    };
  }, [figure.lines, figure.xTitle, figure.yTitle, size, shade]);
  return (
    <div class="sweep-plot" role="img" aria-label={label}>
      <div class="plot" ref={plot} aria-hidden="true" />
    </div>
  );
}
