import { expect, test, vi } from 'vitest';
import { type CloseAnswer, Closing } from '../../src/main/closing';

function closingThat(answer: CloseAnswer) {
  let time = 0;
  const actions = {
    ask: vi.fn(async () => answer),
    requestSave: vi.fn(),
    discard: vi.fn(async () => undefined),
    close: vi.fn(),
    now: () => time,
  };
  const closing = new Closing(actions);
  const tryToClose = async () => {
    const event = { preventDefault: vi.fn() };
    closing.onClose(event);
    await vi.waitFor(() => undefined);
    await Promise.resolve();
    return event.preventDefault.mock.calls.length === 0;
  };
  const pass = (milliseconds: number) => {
    time += milliseconds;
  };
  return { closing, actions, tryToClose, pass };
}

test('without unsaved work the window closes at once', async () => {
  const { actions, tryToClose } = closingThat('cancel');
  expect(await tryToClose()).toBe(true);
  expect(actions.ask).not.toHaveBeenCalled();
});

test('with unsaved work it stays, and stays after Cancel', async () => {
  const { closing, actions, tryToClose } = closingThat('cancel');
  closing.noteState(true);
  expect(await tryToClose()).toBe(false);
  expect(actions.ask).toHaveBeenCalledOnce();
  expect(actions.close).not.toHaveBeenCalled();
});

test('Discard drops the recovery copy and closes', async () => {
  const { closing, actions, tryToClose } = closingThat('discard');
  closing.noteState(true);
  expect(await tryToClose()).toBe(false);
  await vi.waitFor(() => expect(actions.close).toHaveBeenCalledOnce());
  expect(actions.discard).toHaveBeenCalledOnce();
  expect(await tryToClose()).toBe(true);
});

test('Save closes only once the work is saved and the window says so', async () => {
  const { closing, actions, tryToClose } = closingThat('save');
  closing.noteState(true);
  await tryToClose();
  expect(actions.requestSave).toHaveBeenCalledOnce();
  closing.noteSaveStart();
  closing.noteState(true);
  closing.noteSave(true);
  expect(actions.close).not.toHaveBeenCalled();
  closing.noteState(false);
  expect(actions.close).toHaveBeenCalledOnce();
});

test('a save that is cancelled or fails leaves the window open', async () => {
  const { closing, actions, tryToClose } = closingThat('save');
  closing.noteState(true);
  await tryToClose();
  closing.noteSaveStart();
  closing.noteSave(false);
  closing.noteState(false);
  expect(actions.close).not.toHaveBeenCalled();
});

test('work changed while it was being saved leaves the window open', async () => {
  const { closing, actions, tryToClose } = closingThat('save');
  closing.noteState(true);
  await tryToClose();
  closing.noteSaveStart();
  closing.noteSave(true);
  closing.noteState(true);
  closing.noteState(false);
  expect(actions.close).not.toHaveBeenCalled();
});

test('a save of its own long after the question does not close the window', async () => {
  const { closing, actions, tryToClose, pass } = closingThat('save');
  closing.noteState(true);
  await tryToClose();
  pass(60_000);
  closing.noteSaveStart();
  closing.noteSave(true);
  closing.noteState(false);
  expect(actions.close).not.toHaveBeenCalled();
});

test('asked once, however often the window is told to close', async () => {
  const { closing, actions } = closingThat('cancel');
  closing.noteState(true);
  for (let i = 0; i < 3; i++) closing.onClose({ preventDefault: vi.fn() });
  expect(actions.ask).toHaveBeenCalledOnce();
});
