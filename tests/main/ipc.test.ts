import { expect, test, vi } from 'vitest';
import { CHANNELS, type Handlers } from '../../src/main/channels';
import { answerRequests, isTrustedSender, outcomeOf } from '../../src/main/ipc';
import { Refusal } from '../../src/main/refusal';

const PAGE = { url: 'app://bundle/index.html', parent: null };
const handlers = (some: Partial<Handlers>) => some as Handlers;
const quietly = async <T>(work: () => Promise<T>): Promise<T> => {
  const silence = vi.spyOn(console, 'error').mockImplementation(() => undefined);
  try {
    return await work();
  } finally {
    silence.mockRestore();
  }
};

test('the main frame of our own page is trusted', () => {
  expect(isTrustedSender(PAGE)).toBe(true);
  expect(isTrustedSender({ url: 'app://bundle/index.html#part', parent: null })).toBe(true);
});

test.each([
  ['a frame that has gone', null],
  ['no frame at all', undefined],
  ['a frame within the page', { url: 'app://bundle/index.html', parent: PAGE }],
  ['another host', { url: 'app://elsewhere/index.html', parent: null }],
  ['a host that begins like ours', { url: 'app://bundle.elsewhere/index.html', parent: null }],
  ['another scheme', { url: 'https://bundle/index.html', parent: null }],
  ['a file', { url: 'file:///bundle/index.html', parent: null }],
  ['a user name before the host', { url: 'app://someone@bundle/index.html', parent: null }],
  ['an empty address', { url: '', parent: null }],
  ['a blank page', { url: 'about:blank', parent: null }],
])('%s is not trusted and reaches no handler', async (_what, frame) => {
  const handle = vi.fn();
  expect(isTrustedSender(frame)).toBe(false);
  const outcome = await quietly(() => outcomeOf('openStudy', frame, [], handlers({ openStudy: handle })));
  expect(outcome.ok).toBe(false);
  expect(handle).not.toHaveBeenCalled();
});

test('a request as agreed reaches its handler, and its value comes back', async () => {
  const setTheme = vi.fn().mockResolvedValue(null);
  expect(await outcomeOf('setTheme', PAGE, ['dark'], handlers({ setTheme }))).toEqual({
    ok: true,
    value: null,
  });
  expect(setTheme).toHaveBeenCalledWith('dark');
});

test.each([
  ['setTheme', ['pink']],
  ['setTheme', []],
  ['setTheme', ['dark', 'light']],
  ['openStudy', ['/etc/passwd']],
  ['saveStudy', [{ id: '../x', suggestedName: 'a', text: '', as: false }]],
  ['saveStudy', [{ id: null, suggestedName: 'a', text: '', as: false, path: '/etc/passwd' }]],
  ['saveStudy', [{ id: null, suggestedName: 'a', text: 'x'.repeat(17 * 2 ** 20), as: false }]],
  ['exportFile', [{ kind: 'exe', suggestedName: 'a', data: '' }]],
  ['exportFile', [{ kind: 'csv', suggestedName: 'a', data: { length: 1 } }]],
  ['keepRecovery', [{ name: 'a' }]],
] as const)('%s with arguments other than agreed is refused: %#', async (channel, args) => {
  const handle = vi.fn();
  const outcome = await quietly(() => outcomeOf(channel, PAGE, [...args], handlers({ [channel]: handle })));
  expect(outcome.ok).toBe(false);
  expect(handle).not.toHaveBeenCalled();
});

test('pictures and texts are both accepted for export', async () => {
  const exportFile = vi.fn().mockResolvedValue('a.png');
  for (const data of ['<svg/>', new Uint8Array([1, 2]), Buffer.from('ab')]) {
    const args = [{ kind: 'png', suggestedName: 'a', data }];
    expect((await outcomeOf('exportFile', PAGE, args, handlers({ exportFile }))).ok).toBe(true);
  }
});

test('a refusal comes back as its own message', async () => {
  const openStudy = async () => {
    throw new Refusal('"a.json" could not be read: it is a folder.');
  };
  expect(await outcomeOf('openStudy', PAGE, [], handlers({ openStudy }))).toEqual({
    ok: false,
    message: '"a.json" could not be read: it is a folder.',
  });
});

test('any other error comes back as a failure of the program, never as an exception', async () => {
  const openStudy = async () => {
    throw new TypeError('x is undefined');
  };
  const outcome = await quietly(() => outcomeOf('openStudy', PAGE, [], handlers({ openStudy })));
  expect(outcome).toEqual({ ok: false, message: 'The program failed at this (openStudy): x is undefined' });
});

test('exactly the agreed channels are registered', () => {
  const handle = vi.fn();
  answerRequests({ handle }, handlers({}));
  expect(handle.mock.calls.map(([channel]) => channel)).toEqual([...CHANNELS]);
});
