/** The question the window waits for. */

import { type Question, question } from '../state/confirm';
import { Dialog } from './Dialog';

export function QuestionDialog({ title, text, choices, answer }: Question) {
  return (
    <Dialog title={title} onClose={() => answer(null)} class="dialog-small">
      <p>{text}</p>
      <div class="dialog-buttons">
        {choices.map((choice, i) => (
          <button
            key={choice.value}
            type="button"
            class={`button ${i === 0 ? 'button-main' : ''} ${choice.grave ? 'button-grave' : ''}`}
            autofocus={i === 0}
            onClick={() => answer(choice.value)}
          >
            {choice.name}
          </button>
        ))}
      </div>
    </Dialog>
  );
}

export const OpenQuestion = () => question.value && <QuestionDialog {...question.value} />;
