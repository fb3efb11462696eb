/** Reading and changing one value deep in a document, by the key path that problems use: `steps[2].energy_keV`. */

type Node = Record<string, unknown> | unknown[];

export const partsOf = (path: string): (string | number)[] =>
  [...path.matchAll(/\[(\d+)\]|[^.[\]]+/g)].map((match) =>
    match[1] === undefined ? match[0] : Number(match[1]),
  );

export function valueAt(root: unknown, path: string): unknown {
  return partsOf(path).reduce<unknown>(
    (node, part) =>
      node === undefined || node === null ? undefined : (node as Record<string, unknown>)[part],
    root,
  );
}

/** A copy of `root` with the value replaced; `undefined` removes the key. Everything beside the path is shared. */
export function withValueAt<T>(root: T, path: string, value: unknown): T {
  return replace(root as Node, partsOf(path), value) as T;
}

function replace(node: Node | undefined, [part, ...rest]: (string | number)[], value: unknown): Node {
  const copy: Node = Array.isArray(node) ? [...node] : { ...node };
  const slot = copy as Record<string | number, unknown>;
  if (rest.length > 0) slot[part] = replace(slot[part] as Node | undefined, rest, value);
  else if (value === undefined) delete slot[part];
  else slot[part] = value;
  return copy;
}
