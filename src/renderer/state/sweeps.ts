/** The sweeps that a view of the window shows: asked of the worker while their view is open, at every change of study or span. */

import { effect, type Signal, signal } from '@preact/signals';
import type {
  BiasResult,
  BiasSpan,
  HistoryResult,
  Study,
  TemperatureResult,
  TemperatureSpan,
} from '../../core/index';
import type { Swept } from '../worker';
import { latestWins } from './latest';
import { calculations } from './solver';
import { study } from './studySession';
import { type View, view } from './viewState';

export const temperatureSpan = signal<TemperatureSpan>({ from_C: -55, to_C: 125, points: 37 });
export const biasSpan = signal<BiasSpan>({ layer: 1, junctions: 'both', from_V: 0, to_V: 10, points: 41 });

/** The newest answer; null before the first. */
export const temperatureSwept = signal<Swept<TemperatureResult> | null>(null);
export const biasSwept = signal<Swept<BiasResult> | null>(null);
export const historySwept = signal<Swept<HistoryResult> | null>(null);
/** The history has no span: it is that of the whole recipe. */
const wholeRecipe = signal(null);

function follow<Span, Result>(
  name: View,
  span: Signal<Span>,
  answer: Signal<Swept<Result> | null>,
  ask: (study: Study, span: Span) => Promise<Swept<Result>>,
): void {
  const runner = latestWins<{ study: Study; span: Span }, Swept<Result>>(
    (request) => ask(request.study, request.span).catch(stopped),
    (newest) => {
      answer.value = newest;
    },
  );
  effect(() => {
    if (view.value === name) runner.ask({ study: study.value, span: span.value });
  });
}

const stopped = (error: unknown): Swept<never> => ({
  ok: false,
  key: '',
  message: `the calculation stopped: ${error instanceof Error ? error.message : String(error)}`,
});

export function followSweeps(): void {
  follow('history', wholeRecipe, historySwept, (of) => calculations.history(of));
  follow('temperature', temperatureSpan, temperatureSwept, (of, span) => calculations.temperature(of, span));
  follow('bias', biasSpan, biasSwept, (of, span) => calculations.bias(of, span));
}
