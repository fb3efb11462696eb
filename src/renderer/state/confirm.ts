/** A question the window must have answered before it goes on. */

import { signal } from '@preact/signals';

export interface Question {
  readonly title: string;
  readonly text: string;
  /** Buttons from the safest to the one that gives something up; the first has the focus. */
  readonly choices: readonly { readonly value: string; readonly name: string; readonly grave?: boolean }[];
  readonly answer: (value: string | null) => void;
}

export const question = signal<Question | null>(null);

/** The chosen value; null when the question was waved away. */
export function ask(title: string, text: string, choices: Question['choices']): Promise<string | null> {
  return new Promise((resolve) => {
    question.value = {
      title,
      text,
      choices,
      answer(value) {
        question.value = null;
        resolve(value);
      },
    };
  });
}
