/** A titled block of fields that folds away. */

import type { ComponentChildren } from 'preact';
import { useId, useState } from 'preact/hooks';
import { Icon } from './Icon';

interface Props {
  title: string;
  /** What stands in the head while folded. */
  summary: string;
  startsOpen?: boolean;
  children: ComponentChildren;
}

export function Card({ title, summary, startsOpen = false, children }: Props) {
  const [open, setOpen] = useState(startsOpen);
  const id = useId();
  return (
    <section class={`card ${open ? 'card-open' : ''}`} aria-label={title}>
      <button
        type="button"
        class="card-head"
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen(!open)}
      >
        <Icon name="chevron" />
        <span class="card-title">{title}</span>
        <span class="card-summary" title={summary}>
          {summary}
        </span>
      </button>
      {open && (
        <div class="card-body" id={id}>
          {children}
        </div>
      )}
    </section>
  );
}
