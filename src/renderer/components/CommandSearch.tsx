/** Find a command by typing part of its name. */

import { useId, useState } from 'preact/hooks';
import { allCommands, type Command } from '../state/commands';
import { panel } from '../state/viewState';
import { Dialog } from './Dialog';

const close = (): void => {
  panel.value = null;
};

/** Commands that hold every typed word, those that begin with the text first. */
function found(commands: readonly Command[], typed: string): Command[] {
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  const begins = ({ name }: Command): number =>
    Number(!name.toLowerCase().startsWith(typed.trim().toLowerCase()));
  return commands
    .filter(({ name }) => words.every((word) => name.toLowerCase().includes(word)))
    .sort((a, b) => begins(a) - begins(b));
}

export function CommandSearch() {
  const [typed, setTyped] = useState('');
  const [at, setAt] = useState(0);
  const id = useId();
  const commands = found(allCommands(), typed);

  function run(command: Command | undefined): void {
    if (!command || command.isOff?.()) return;
    close();
    command.run();
  }

  function onKeyDown(event: KeyboardEvent): void {
    const go = (to: number): void => {
      event.preventDefault();
      const next = (to + commands.length) % Math.max(1, commands.length);
      setAt(next);
      document.getElementById(`${id}-${next}`)?.scrollIntoView({ block: 'nearest' });
    };
    if (event.key === 'ArrowDown') go(at + 1);
    else if (event.key === 'ArrowUp') go(at - 1);
    else if (event.key === 'Enter') run(commands[at]);
  }

  return (
    <Dialog title="Find a command" onClose={close} class="dialog-commands">
      <input
        type="text"
        class="command-input"
        role="combobox"
        aria-label="Part of a command's name"
        aria-expanded="true"
        aria-controls={`${id}-list`}
        aria-activedescendant={commands.length > 0 ? `${id}-${at}` : undefined}
        placeholder="Type part of its name"
        autofocus
        value={typed}
        onInput={(event) => {
          setTyped(event.currentTarget.value);
          setAt(0);
        }}
        onKeyDown={onKeyDown}
      />
      <div class="command-list" role="listbox" id={`${id}-list`} aria-label="Commands">
        {commands.map((command, i) => (
          // biome-ignore lint/a11y/useKeyWithClickEvents: the combobox above holds the focus and takes the keys.
          <div
            key={command.id}
            id={`${id}-${i}`}
            role="option"
            tabIndex={-1}
            aria-selected={i === at}
            aria-disabled={command.isOff?.() ?? false}
            onClick={() => run(command)}
          >
            <span>{command.name}</span>
            {command.keys && <kbd>{command.keys}</kbd>}
          </div>
        ))}
      </div>
      {commands.length === 0 && <p class="card-note">No command has all of these words.</p>}
    </Dialog>
  );
}
