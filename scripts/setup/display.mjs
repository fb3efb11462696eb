/** Whether there is a display that answers. Electron without one does not fail cleanly, so this is asked first. */

import { existsSync } from 'node:fs';
import { connect } from 'node:net';
import { resolve } from 'node:path';

const ANSWER_MS = 2_000;

function answers(address) {
  return new Promise((done) => {
    const socket = connect({ ...address, timeout: ANSWER_MS });
    const end = (result) => {
      socket.destroy();
      done(result);
    };
    socket
      .on('connect', () => end(true))
      .on('error', () => end(false))
      .on('timeout', () => end(false));
  });
}

export async function displayWorks(environment = process.env) {
  if (process.platform !== 'linux') return true;
  const { DISPLAY, WAYLAND_DISPLAY, XDG_RUNTIME_DIR } = environment;
  if (!DISPLAY && WAYLAND_DISPLAY) return existsSync(resolve(XDG_RUNTIME_DIR ?? '/', WAYLAND_DISPLAY));
  const parts = /^(?<host>[^:]*):(?<number>\d+)(\.\d+)?$/.exec(DISPLAY ?? '')?.groups;
  if (!parts) return false;
  const isLocal = parts.host === '' || parts.host === 'unix';
  return answers(
    isLocal
      ? { path: `/tmp/.X11-unix/X${parts.number}` }
      : { host: parts.host, port: 6000 + Number(parts.number) },
  );
}
