/** One SHA-256 for one study: equal studies give equal fingerprints whatever the order of their keys. */

import { sha256Hex } from './hash';
import type { Study } from './schema';

/** SHA-256 (hex) of the study as JSON with sorted keys. */
export function fingerprint(study: Study): string {
  return sha256Hex(new TextEncoder().encode(JSON.stringify(study, sortKeys)));
}

function sortKeys(_key: string, value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)));
}
