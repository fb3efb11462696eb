/**
 * Writes the two demo tables, which look like depth profiles from a mass spectrometer and are invented: analytic curves with
 * seeded noise. `node scripts/demo-tables.mjs [FOLDER]`; the folder is demo-profiles unless stated.
 */

import { writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const INVENTED = 'Invented data: analytic curves with seeded noise, no measurement and no real sample';

/** Uniform numbers in 0 to 1 from a 32-bit seed (mulberry32, public domain, from memory). */
function uniform(seed) {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Normal deviates by the method of Box and Muller (1958). */
function normal(seed) {
  const next = uniform(seed);
  return () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next());
}

/** A signal as counted: relative noise grows as the counts fall; `perCount` is the concentration of one count. */
function measured(concentration, perCount, deviate) {
  const counts = concentration / perCount;
  return Math.max(0, concentration * (1 + (0.01 + 1 / Math.sqrt(counts + 1)) * deviate()));
}

/** Well of the resistor lot: a Gaussian left by an implant and an anneal, above a floor of the instrument. */
function boronCsv() {
  const deviate = normal(20260101);
  const lines = [
    `# ${INVENTED}`,
    '# scenario: p-well resistor, first lot; boron after the well anneal',
    '# crater 1, depth by profilometer',
    'Depth (nm),11B (atoms/cm3)',
  ];
  for (let step = 0; step <= 320; step++) {
    const nm = 2 + 5 * step;
    const truth = 4.2e17 * Math.exp(-(((nm - 195) / 155) ** 2)) + 4e14;
    lines.push(`${nm.toFixed(1)},${measured(truth, 2e13, deviate).toExponential(3)}`);
  }
  return `${lines.join('\n')}\n`;
}

/** Emitter and base: a box-like arsenic layer, boron below it; the crater was resumed once, a little above where it stopped. */
function arsenicBoronText() {
  const deviate = normal(20260102);
  const comma = (number, digits) => number.toExponential(digits).toUpperCase().replace('.', ',');
  const lines = [
    INVENTED,
    'scenario: emitter and base of the invented lot, crater resumed at 0,6 µm',
    'detection limit of 75As 2E15',
    '',
    '75As\t\t11B\t',
    'Depth\tConcentration\tDepth\tConcentration',
    'µm\tatoms/cc\tµm\tatoms/cc',
  ];
  const depths = [];
  for (let um = 0.004; um < 0.6; um += 0.004) depths.push(um);
  for (let um = 0.59; um <= 1.4; um += 0.008) depths.push(um);
  for (const um of depths) {
    const arsenic = 1.8e20 / (1 + (um / 0.21) ** 14) + 6e14;
    const boron = 1.1e18 * Math.exp(-((um / 0.42) ** 2)) + 3e14;
    const shown = measured(arsenic, 4e14, deviate);
    const x = um.toFixed(4).replace('.', ',');
    const y = (um + 0.001).toFixed(4).replace('.', ',');
    lines.push(
      [x, shown < 2e15 ? '<2E15' : comma(shown, 3), y, comma(measured(boron, 2e13, deviate), 3)].join('\t'),
    );
  }
  return `${lines.join('\r\n')}\r\n`;
}

const folder = process.argv[2] ?? join(dirname(fileURLToPath(import.meta.url)), '..', 'demo-profiles');
writeFileSync(join(folder, 'sims-boron.csv'), boronCsv());
writeFileSync(join(folder, 'sims-arsenic-boron.txt'), arsenicBoronText());
