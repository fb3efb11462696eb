/** Writes a flat asar archive (name -> text): enough for the default app of a runtime that lacks one. */

const UINT32 = 4;

export function asar(files) {
  const entries = {};
  const bodies = [];
  let offset = 0;
  for (const [name, text] of Object.entries(files)) {
    const body = Buffer.from(text);
    entries[name] = { size: body.length, offset: String(offset) };
    offset += body.length;
    bodies.push(body);
  }
  // The head is two nested length-prefixed records, the inner one padded to whole words.
  const json = Buffer.from(JSON.stringify({ files: entries }));
  const padded = Math.ceil(json.length / UINT32) * UINT32;
  const head = Buffer.alloc(4 * UINT32 + padded);
  const lengths = [UINT32, 2 * UINT32 + padded, UINT32 + padded, json.length];
  for (const [index, length] of lengths.entries()) head.writeUInt32LE(length, index * UINT32);
  json.copy(head, lengths.length * UINT32);
  return Buffer.concat([head, ...bodies]);
}
