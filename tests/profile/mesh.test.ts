import { describe, expect, test } from 'vitest';
import { integrate } from '../../src/core/numeric/simpson';
import { buildMesh, type Mesh } from '../../src/core/profile/mesh';

const UM = 1e-4;

/** A Gaussian acceptor in a uniform donor background. */
function gaussianInBackground(peak: number, mean: number, sigma: number, background: number) {
  return (depth: number) => {
    const acceptors = peak * Math.exp(-(((depth - mean) / sigma) ** 2) / 2);
    return { net: background - acceptors, total: background + acceptors, doping: Float64Array.of(acceptors) };
  };
}

function column(mesh: Mesh, pick: (node: Mesh['nodes'][number]) => number): Float64Array {
  return Float64Array.from(mesh.nodes, pick);
}

describe('buildMesh', () => {
  const sample = gaussianInBackground(1e18, 0.2 * UM, 0.06 * UM, 1e15);
  const request = { end: 525 * UM, marks: [0.2 * UM, 0.26 * UM], jumps: [], sample, refinement: 1 };
  const mesh = buildMesh(request);

  test('puts the middle of every cell exactly half-way', () => {
    const x = column(mesh, (node) => node.depth);
    expect(x.length % 2).toBe(1);
    for (let i = 0; i + 2 < x.length; i += 2) expect(x[i + 1]).toBe((x[i] + x[i + 2]) / 2);
  });

  test('starts at the surface, ends at the end, ascends', () => {
    const x = column(mesh, (node) => node.depth);
    expect(x[0]).toBe(0);
    expect(x[x.length - 1]).toBe(525 * UM);
    for (let i = 1; i < x.length; i++) expect(x[i]).toBeGreaterThan(x[i - 1]);
  });

  test('finds both junctions of a buried Gaussian where the closed form says', () => {
    const reach = 0.06 * Math.sqrt(2 * Math.log(1e18 / 1e15));
    expect(mesh.junctions).toHaveLength(1);
    expect(mesh.nodes[mesh.junctions[0]].depth / UM).toBeCloseTo(0.2 + reach, 9);
    const deep = buildMesh({ ...request, sample: gaussianInBackground(1e18, 0.4 * UM, 0.06 * UM, 1e15) });
    expect(deep.junctions.map((i) => deep.nodes[i].depth / UM)).toEqual([
      expect.closeTo(0.4 - reach, 9),
      expect.closeTo(0.4 + reach, 9),
    ]);
    for (const i of deep.junctions) expect(i % 2).toBe(0);
  });

  test('finds a junction at an abrupt step, to a thousandth of a nanometre', () => {
    const step = (depth: number) => {
      const acceptors = depth < 1 * UM ? 1e18 : 0;
      return { net: 1e15 - acceptors, total: 1e15 + acceptors, doping: Float64Array.of(acceptors) };
    };
    const abrupt = buildMesh({ end: 10 * UM, marks: [], jumps: [1 * UM], sample: step, refinement: 1 });
    expect(abrupt.junctions).toHaveLength(1);
    expect(Math.abs(abrupt.nodes[abrupt.junctions[0]].depth - UM)).toBeLessThan(2e-10);
  });

  test('integrates the dose of the Gaussian to 1e-6 with a few hundred nodes', () => {
    const x = column(mesh, (node) => node.depth);
    const dose = integrate(
      x,
      column(mesh, (node) => node.doping[0]),
      0,
      x.length - 1,
    );
    const exact = 1e18 * 0.06 * UM * Math.sqrt(2 * Math.PI) * 0.99957093965; // Phi(0.2/0.06)
    expect(Math.abs(dose / exact - 1)).toBeLessThan(1e-6);
    expect(x.length).toBeLessThan(600);
  });

  test('refines: twice the refinement takes about twice the nodes and a smaller error', () => {
    const fine = buildMesh({ ...request, refinement: 2 });
    expect(fine.nodes.length / mesh.nodes.length).toBeGreaterThan(1.6);
    expect(fine.nodes[fine.junctions[0]].depth).toBeCloseTo(mesh.nodes[mesh.junctions[0]].depth, 11);
  });

  test('lets no tail have the weight of a wide cell', () => {
    // Same type: what lies above the background ends in the first micrometre of 525.
    const added = (depth: number) => 4.5e17 * Math.exp(-(((depth - UM) / (0.19 * UM)) ** 2) / 2);
    const sum = (depth: number) => {
      const donors = 4.1e16 + added(depth);
      return { net: donors, total: donors, doping: Float64Array.of(donors) };
    };
    for (const marks of [[], [0.62 * UM, 0.81 * UM, UM, 1.19 * UM, 1.38 * UM, 1.76 * UM]]) {
      const made = buildMesh({ end: 525 * UM, marks: [UM, ...marks], jumps: [], sample: sum, refinement: 1 });
      const x = column(made, (node) => node.depth);
      const dose = integrate(
        x,
        column(made, (node) => node.net),
        0,
        x.length - 1,
      );
      const exact = 4.1e16 * 525 * UM + 4.5e17 * 0.19 * UM * Math.sqrt(2 * Math.PI);
      expect(Math.abs(dose / exact - 1)).toBeLessThan(1e-6);
    }
  });

  test('has no cell more than four times as wide as its neighbour, but for splinters beside a junction', () => {
    const x = column(mesh, (node) => node.depth);
    const width = (end: number) => x[end + 2] - x[end];
    const cut = mesh.junctions[0];
    for (let end = 0; end + 4 < x.length; end += 2) {
      if (Math.abs(end + 2 - cut) <= 4) continue;
      const ratio = width(end + 2) / width(end);
      expect(Math.max(ratio, 1 / ratio)).toBeLessThan(4 * (1 + 1e-9));
    }
  });

  test('resolves net doping that nearly cancels', () => {
    const compensated = (depth: number) => {
      const acceptors = 1e17 * (1 - 0.001 * Math.sin((depth / UM) * 6 * Math.PI) ** 2);
      return { net: 1e17 - acceptors + 1e12, total: 1e17 + acceptors, doping: Float64Array.of(acceptors) };
    };
    const made = buildMesh({ end: UM, marks: [0.31 * UM], jumps: [], sample: compensated, refinement: 1 });
    const x = column(made, (node) => node.depth);
    const net = integrate(
      x,
      column(made, (node) => node.net),
      0,
      x.length - 1,
    );
    expect(Math.abs(net / (UM * (0.5e14 + 1e12)) - 1)).toBeLessThan(1e-4);
  });
});
