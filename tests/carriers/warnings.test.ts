import { expect, test } from 'vitest';
import { intrinsicWarnings } from '../../src/core/carriers/warnings';

test('the intrinsic density is warned about outside its measurements, and only there', () => {
  expect(intrinsicWarnings(298.15)).toEqual([]);
  expect(intrinsicWarnings(340)).toEqual([]);
  expect(intrinsicWarnings(340.1)[0].message).toMatch(/340\.1 K is extrapolated.*78 to 340 K/);
});
