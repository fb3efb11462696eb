/** The border between window and main process: every request passes here, and every answer is an `Outcome`. */

import type { IpcMain } from 'electron';
import { type AnyOutcome, CHANNELS, type Channel, type Handlers } from './channels';
import { isOwnPage } from './ownPage';
import { Refusal } from './refusal';
import { REQUESTS } from './requests';

/** The part of Electron's frame that the check needs; null once the frame has gone. */
export type SenderFrame = { url: string; parent: unknown } | null | undefined;

/** Only the main frame of our own page may ask for anything. */
export function isTrustedSender(frame: SenderFrame): boolean {
  return !!frame && frame.parent === null && isOwnPage(frame.url);
}

/** Checks sender and arguments, runs the handler, and gives its value or its failure. Never rejects. */
export async function outcomeOf(
  channel: Channel,
  frame: SenderFrame,
  args: unknown[],
  handlers: Handlers,
): Promise<AnyOutcome> {
  if (!isTrustedSender(frame)) return refuse(channel, 'the sender is not the window');
  const request = REQUESTS[channel].safeParse(args);
  if (!request.success) return refuse(channel, 'its arguments are not as agreed');
  const handle = handlers[channel] as (...request: unknown[]) => Promise<unknown>;
  try {
    return { ok: true, value: await handle(...request.data) };
  } catch (error) {
    if (error instanceof Refusal) return { ok: false, message: error.message };
    console.error(`${channel}:`, error);
    return { ok: false, message: `The program failed at this (${channel}): ${messageOf(error)}` };
  }
}

const messageOf = (error: unknown) => (error instanceof Error ? error.message : String(error));

function refuse(channel: Channel, why: string): AnyOutcome {
  console.error(`request ${channel} refused: ${why}`);
  return { ok: false, message: `The request ${channel} was refused: ${why}.` };
}

export function answerRequests(ipcMain: Pick<IpcMain, 'handle'>, handlers: Handlers): void {
  for (const channel of CHANNELS)
    ipcMain.handle(channel, (event, ...args) => outcomeOf(channel, event.senderFrame, args, handlers));
}
