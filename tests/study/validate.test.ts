import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { InputProblem } from '../../src/core/study/problem';
import { parseStudy, studyProblems, validateStudy } from '../../src/core/study/validate';
import { studyJsonSchema, writeStudy } from '../../src/core/study/write';

const minimal = {
  format: 'ohmstrata-study/1',
  wafer: { dopant: 'phosphorus', concentration_cm3: 1.3e15 },
};
const implant = { step: 'implant', dopant: 'boron', dose_cm2: 1e13, energy_keV: 60 };

function messageOf(value: unknown): string {
  try {
    validateStudy(value, 'a.json');
  } catch (error) {
    if (error instanceof InputProblem) return error.oneLine;
    throw error;
  }
  return 'accepted';
}

function messageOfText(text: string): string {
  try {
    parseStudy(text, 'a.json');
  } catch (error) {
    if (error instanceof InputProblem) return error.oneLine;
    throw error;
  }
  return 'accepted';
}

describe('a valid study', () => {
  test('gets every default filled in', () => {
    expect(validateStudy(minimal)).toMatchObject({
      temperature_C: 25,
      wafer: { material: 'silicon', thickness_um: 525, orientation: '100' },
      steps: [],
      models: { mobility: 'klaassen', activation: 'full', ranges: 'universal', diffusivity: 'fair1981' },
    });
  });

  test('survives writing and reading, a second time to the byte', () => {
    const text = writeStudy(validateStudy({ ...minimal, steps: [implant], name: 'p-well "first" lot' }));
    expect(writeStudy(parseStudy(text))).toBe(text);
    expect(text.endsWith('}\n')).toBe(true);
  });

  test('may begin with a byte order mark', () => {
    expect(parseStudy(`\ufeff${JSON.stringify(minimal)}`).temperature_C).toBe(25);
  });

  test('takes the activation as a word or as fractions', () => {
    expect(studyProblems({ ...minimal, models: { activation: { boron: 0.9 } } })).toEqual([]);
    expect(messageOf({ ...minimal, models: { activation: { boron: 1.1 } } })).toMatch(/activation/);
    expect(messageOf({ ...minimal, models: { activation: { xenon: 0.5 } } })).toMatch(/activation/);
  });
});

describe('what is wrong is said with place, finding and what is allowed', () => {
  test.each([
    ['an unknown key', { ...minimal, wafr: {} }, /a\.json: wafr: unknown key "wafr"; did you mean "wafer"\?/],
    [
      'an unknown key of a step',
      { ...minimal, steps: [{ ...implant, energy_kev: 3 }] },
      /steps\[0\]\.energy_kev: unknown key.*did you mean "energy_keV"/,
    ],
    [
      'an unknown key inside a screen',
      { ...minimal, steps: [{ ...implant, screen: { material: 'oxide', thickness_nm: 20, colour: 1 } }] },
      /steps\[0\]\.screen\.colour: unknown key "colour"/,
    ],
    [
      'an unknown key of the models',
      { ...minimal, models: { mobilty: 'arora' } },
      /models\.mobilty.*"mobility"/,
    ],
    ['an unknown step', { ...minimal, steps: [{ step: 'implnt' }] }, /steps\[0\].*allowed: gaussian, erfc/],
    [
      'an unknown dopant',
      { ...minimal, wafer: { dopant: 'gold', concentration_cm3: 1 } },
      /wafer\.dopant: found "gold"; allowed: boron,/,
    ],
    [
      'a missing key',
      { ...minimal, steps: [{ step: 'implant', dopant: 'boron', dose_cm2: 1e13 }] },
      /steps\[0\]\.energy_keV: missing; a number is needed/,
    ],
    [
      'a text for a number',
      { ...minimal, temperature_C: '25' },
      /temperature_C: found "25"; a number is needed/,
    ],
    [
      'a value too large',
      { ...minimal, temperature_C: 400 },
      /temperature_C: found 400; the largest allowed is 226\.85/,
    ],
    [
      'a negative dose',
      { ...minimal, steps: [{ ...implant, dose_cm2: -1e13 }] },
      /dose_cm2: found -1.*the smallest allowed is 1000000/,
    ],
    ['a list for a study', [], /a study is a JSON object; found \[\]/],
    [
      'a future format',
      { ...minimal, format: 'ohmstrata-study/7' },
      /format: this study has format version 7; this program reads version 1/,
    ],
    [
      'a foreign format',
      { ...minimal, format: 'other' },
      /format: found "other"; allowed is "ohmstrata-study\/1"/,
    ],
    [
      'doping stated twice',
      { ...minimal, wafer: { dopant: 'boron', concentration_cm3: 1e15, resistivity_ohmCm: 1 } },
      /wafer: the doping is stated twice/,
    ],
    [
      'doping missing',
      { ...minimal, wafer: { dopant: 'boron' } },
      /wafer: the doping is missing; give either concentration_cm3 or resistivity_ohmCm/,
    ],
    [
      'a buried oxide below the wafer',
      { ...minimal, wafer: { ...minimal.wafer, buriedOxide_um: 600 } },
      /buriedOxide_um: found 600; it must lie within/,
    ],
    [
      'a box upside down',
      {
        ...minimal,
        steps: [{ step: 'uniform', dopant: 'boron', concentration_cm3: 1e15, from_um: 2, to_um: 1 }],
      },
      /to_um: found 1; it must be deeper than from_um 2/,
    ],
    [
      'half a doped epitaxy',
      { ...minimal, steps: [{ step: 'epitaxy', thickness_um: 2, dopant: 'boron' }] },
      /needs both dopant and concentration_cm3/,
    ],
    [
      'a table without data',
      { ...minimal, steps: [{ step: 'table', dopant: 'boron' }] },
      /steps\[0\]: the data are missing/,
    ],
    [
      'a table of unequal lists',
      {
        ...minimal,
        steps: [{ step: 'table', dopant: 'boron', depth_um: [0, 1, 2], concentration_cm3: [1, 2] }],
      },
      /2 values for 3 depths/,
    ],
    [
      'descending embedded depths',
      {
        ...minimal,
        steps: [{ step: 'table', dopant: 'boron', depth_um: [0, 1, 0.5], concentration_cm3: [1, 2, 3] }],
      },
      /depth_um\[2\]: found 0\.5 after 1; depths must ascend/,
    ],
    [
      'a table from a file and embedded',
      {
        ...minimal,
        steps: [
          { step: 'table', dopant: 'boron', file: 'a.csv', depth_um: [0, 1], concentration_cm3: [1, 2] },
        ],
      },
      /stated twice/,
    ],
    [
      'too many steps',
      { ...minimal, steps: Array(201).fill(implant) },
      /steps: .*the largest allowed is 200 entries/,
    ],
  ])('%s', (_what, value, message) => {
    expect(messageOf(value)).toMatch(message);
    expect(messageOf(value)).not.toMatch(/\n/);
  });

  test('several problems are counted, and all can be had at once', () => {
    const twice = { ...minimal, temperature_C: 1e3, name: 7 };
    expect(messageOf(twice)).toMatch(/\(and 1 more\)$/);
    expect(
      studyProblems(twice)
        .map(({ key }) => key)
        .sort(),
    ).toEqual(['name', 'temperature_C']);
  });
});

describe('texts that are no study', () => {
  test.each([
    ['empty', '', /the file is empty/],
    ['blank', ' \n ', /the file is empty/],
    ['cut off', '{\n "format": "ohmstrata-study/1",\n "wafer": {', /a\.json: line 3: not valid JSON/],
    ['not a number', '{"format":"ohmstrata-study/1","temperature_C":NaN}', /line 1: not valid JSON/],
    ['binary', '\u0000\u0001\u0002', /not valid JSON/],
    [
      'reaching for the prototype',
      '{"format":"ohmstrata-study/1","__proto__":{"x":1}}',
      /__proto__: the key "__proto__" is not allowed/,
    ],
    [
      'overflowing',
      '{"format":"ohmstrata-study/1","wafer":{"dopant":"boron","concentration_cm3":1e999}}',
      /concentration_cm3: found/,
    ],
  ])('%s', (_what, text, message) => {
    expect(messageOfText(text)).toMatch(message);
  });

  test('too large a text is refused before it is parsed', () => {
    expect(messageOfText(' '.repeat(8_000_001))).toMatch(/8000001 characters; at most 8000000/);
  });

  test('no JSON value whatever ends in anything but a study or an InputProblem', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const changed = { ...minimal, ...(value as object) };
        for (const candidate of [
          value,
          changed,
          { ...minimal, steps: [value] },
          { ...minimal, wafer: value },
        ])
          expect(typeof messageOf(candidate)).toBe('string');
      }),
      { numRuns: 300, seed: 7 },
    );
  });
});

test('the published JSON Schema comes from the same definition', () => {
  const schema = studyJsonSchema() as { properties: Record<string, unknown>; required: string[] };
  expect(Object.keys(schema.properties)).toContain('wafer');
  expect(schema.required).toEqual(['format', 'wafer']);
});
