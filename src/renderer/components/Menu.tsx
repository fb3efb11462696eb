/** A button that opens a list of actions; arrow keys walk it, Esc or leaving it closes it. */

import type { ComponentChildren } from 'preact';
import { useEffect, useId, useRef, useState } from 'preact/hooks';

export interface MenuItem {
  readonly name: string;
  /** A second, quieter line. */
  readonly note?: string;
  /** Key combination to show. */
  readonly keys?: string;
  readonly disabled?: boolean;
  /** A heading above this item. */
  readonly heading?: string;
  readonly checked?: boolean;
  readonly run: () => void;
}

interface Props {
  label: ComponentChildren;
  /** What the button is called when its label is not enough. */
  name?: string;
  items: readonly MenuItem[];
  class?: string;
  align?: 'start' | 'end';
}

export function Menu({ label, name, items, class: extra = '', align = 'start' }: Props) {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const id = useId();

  const itemNodes = (): HTMLButtonElement[] => [
    ...(root.current?.querySelectorAll<HTMLButtonElement>('[role^="menuitem"]:not(:disabled)') ?? []),
  ];

  useEffect(() => {
    if (!open) return;
    root.current?.querySelector('[role="menu"]')?.scrollIntoView({ block: 'nearest' });
    itemNodes()[0]?.focus();
  }, [open]);

  function close(): void {
    setOpen(false);
    button.current?.focus();
  }

  function onKeyDown(event: KeyboardEvent): void {
    if (!open) return;
    const nodes = itemNodes();
    const at = nodes.indexOf(document.activeElement as HTMLButtonElement);
    const go = (to: number): void => {
      event.preventDefault();
      nodes[(to + nodes.length) % nodes.length]?.focus();
    };
    if (event.key === 'ArrowDown') go(at + 1);
    else if (event.key === 'ArrowUp') go(at - 1);
    else if (event.key === 'Home') go(0);
    else if (event.key === 'End') go(nodes.length - 1);
    else if (event.key === 'Tab') setOpen(false);
    else if (event.key === 'Escape') {
      event.stopPropagation();
      close();
    } else if (event.key.length === 1 && !event.ctrlKey && !event.metaKey && event.key !== ' ') {
      const starts = (node: HTMLElement) =>
        node.textContent?.trim().toLowerCase().startsWith(event.key.toLowerCase());
      [...nodes.slice(at + 1), ...nodes.slice(0, at + 1)].find(starts)?.focus();
    }
  }

  function onFocusOut(event: FocusEvent): void {
    if (open && !root.current?.contains(event.relatedTarget as Node | null)) setOpen(false);
  }

  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: the keys belong to the button and the items inside.
    <div class={`menu ${extra}`} ref={root} onKeyDown={onKeyDown} onFocusOut={onFocusOut}>
      <button
        type="button"
        ref={button}
        class="button"
        aria-label={name}
        title={name}
        aria-haspopup="menu"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        onClick={() => setOpen(!open)}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown' || open) return;
          event.preventDefault();
          setOpen(true);
        }}
      >
        {label}
      </button>
      {open && (
        <div class={`menu-list menu-${align}`} role="menu" id={id}>
          {items.map((item) => (
            <>
              {item.heading && (
                <div class="menu-heading" role="presentation">
                  {item.heading}
                </div>
              )}
              {/* biome-ignore lint/a11y/useAriaPropsSupportedByRole: only an item that is a menuitemradio has `checked`. */}
              <button
                type="button"
                tabIndex={-1}
                role={item.checked === undefined ? 'menuitem' : 'menuitemradio'}
                aria-checked={item.checked}
                disabled={item.disabled}
                onClick={() => {
                  close();
                  item.run();
                }}
              >
                <span class="menu-name">{item.name}</span>
                {item.keys && <kbd>{item.keys}</kbd>}
                {item.note && <span class="menu-note">{item.note}</span>}
              </button>
            </>
          ))}
        </div>
      )}
    </div>
  );
}
