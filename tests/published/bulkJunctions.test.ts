import { describe, expect, test } from 'vitest';
import { equilibrium } from '../../src/core/carriers/equilibrium';
import { choice } from '../support/carriers';
import { dopingOf } from '../support/doping';
import { publishedTable } from './table';

interface Row {
  id: string;
  peak_cm3: number;
  length_um: number;
  donors_cm3: number;
  metallurgical_um: number;
  electrical_um: number;
}

const UM = 1e-4;

describe('where n = p in an intact p-on-n sample, against an independent program', () => {
  // The intrinsic density here is 3 % lower than in the table, which moves the junction by up to 0.25 nm.
  test.each(publishedTable<Row>('bulk-junctions').map((row) => [row.id, row] as const))(
    '%s, to 1 nm',
    (_id, row) => {
      const length = row.length_um * UM;
      const doping = dopingOf(
        () => row.donors_cm3,
        (x) => row.peak_cm3 * Math.exp(-((x / length) ** 2)),
        50 * UM,
        [0.1, 0.5, 1, 2, 3].map((part) => part * length),
      );
      const state = equilibrium(doping, choice({ temperature: 300 }));
      expect(doping.depth[doping.junctions[0]] / UM).toBeCloseTo(row.metallurgical_um, 7);
      expect(Math.abs(state.doping.depth[state.cuts[0]] / UM - row.electrical_um)).toBeLessThan(1e-3);
    },
  );
});
