/** A modal dialog in the browser's own top layer: focus stays inside, Esc closes it. */

import type { ComponentChildren } from 'preact';
import { useId, useLayoutEffect, useRef } from 'preact/hooks';
import { IconButton } from './IconButton';

interface Props {
  title: string;
  onClose: () => void;
  children: ComponentChildren;
  class?: string;
}

export function Dialog({ title, onClose, children, class: extra = '' }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();
  useLayoutEffect(() => {
    const before = document.activeElement as HTMLElement | null;
    dialog.current?.showModal();
    return () => before?.focus?.();
  }, []);
  return (
    // biome-ignore lint/a11y/useKeyWithClickEvents: a click beside the dialog does what Esc does.
    <dialog
      ref={dialog}
      class={`dialog ${extra}`}
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onClick={(event) => {
        if (event.target === dialog.current) onClose();
      }}
    >
      <div class="dialog-inside">
        <div class="dialog-head">
          <h2 id={id}>{title}</h2>
          <IconButton icon="close" name="Close" onClick={onClose} />
        </div>
        {children}
      </div>
    </dialog>
  );
}
