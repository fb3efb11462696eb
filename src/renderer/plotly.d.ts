/** The few functions of the plotting library that the window uses; the package ships no types. */

declare module 'plotly.js-cartesian-dist-min' {
  export interface PlotElement extends HTMLElement {
    on(event: 'plotly_relayout', listener: (change: Record<string, unknown>) => void): void;
    on(event: 'plotly_doubleclick', listener: () => boolean | undefined): void;
  }

  export interface ImageRequest {
    format: 'svg' | 'png';
    width: number;
    height: number;
    scale?: number;
  }

  export interface Figure {
    data: object[];
    layout: object;
    config?: object;
  }

  export interface Plotly {
    newPlot(element: HTMLElement, data: object[], layout: object, config?: object): Promise<PlotElement>;
    react(element: HTMLElement, data: object[], layout: object, config?: object): Promise<PlotElement>;
    relayout(element: HTMLElement, change: Record<string, unknown>): Promise<PlotElement>;
    purge(element: HTMLElement): void;
    /** A data URL. */
    toImage(figure: Figure, request: ImageRequest): Promise<string>;
  }

  const plotly: Plotly;
  export default plotly;
}
