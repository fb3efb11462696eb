import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { TableDelimiter } from '../../../src/core/study/names';
import { InputProblem } from '../../../src/core/study/problem';
import type { TableChoice } from '../../../src/core/study/schema';
import { readTable } from '../../../src/core/study/table/read';
import type { ColumnChoice } from '../../../src/core/study/table/reading';

const utf8 = (text: string) => new TextEncoder().encode(text);
const latin = (text: string) => Uint8Array.from(text, (sign) => sign.charCodeAt(0));
const utf16 = (text: string, big: boolean) => {
  const bytes = new Uint8Array(2 * text.length);
  const view = new DataView(bytes.buffer);
  for (let i = 0; i < text.length; i++) view.setUint16(2 * i, text.charCodeAt(i), !big);
  return bytes;
};
const read = (text: string, choice?: TableChoice, columns?: ColumnChoice) =>
  readTable(utf8(text), choice, 't.csv', columns);
const codes = (reading: { warnings: { code: string }[] }) => reading.warnings.map(({ code }) => code);

function problem(run: () => unknown): string {
  try {
    run();
  } catch (error) {
    if (error instanceof InputProblem) return error.oneLine;
    throw error;
  }
  throw new Error('no problem was found');
}

const SIMPLE = 'Depth (nm),B (atoms/cc)\n10,1e18\n20,2e18\n30,3e18\n';

describe('readTable: what it reads', () => {
  test('reads depths in um and concentrations in cm^-3, and names what each column is', () => {
    const reading = read(SIMPLE);
    expect(reading.questions).toEqual([]);
    expect(reading.warnings).toEqual([]);
    expect(reading.profiles).toHaveLength(1);
    const [profile] = reading.profiles;
    expect([...profile.depth_um]).toEqual([0.01, 0.02, 0.03]);
    expect([...profile.concentration_cm3]).toEqual([1e18, 2e18, 3e18]);
    expect(profile).toMatchObject({
      dopant: 'boron',
      depthColumn: 1,
      concentrationColumn: 2,
      belowDetection: 0,
    });
    expect(reading.choice).toEqual({
      delimiter: 'comma',
      decimal: '.',
      skip: 0,
      encoding: 'utf-8',
      depthUnit: 'nm',
      concentrationUnit: 'cm-3',
    });
    expect(reading.preview[1]).toEqual(['20', '2000000000000000000']);
  });

  test('finds the numbers behind a preamble, comments, a ruler and blank lines, and keeps the text', () => {
    const reading = read(
      'Instrument report\nPrimary ion;O2+;5 keV\n\n# invented data\nDepth / um;As / cm-3\n-----;-----\n\n0;1e20\n# paused\n0,5;1e19\n\n1;1e18\nend of data\n',
    );
    expect([...reading.profiles[0].depth_um]).toEqual([0, 0.5, 1]);
    expect(reading.metadata).toEqual([
      'Instrument report',
      'Primary ion;O2+;5 keV',
      'invented data',
      'Depth / um;As / cm-3',
      '-----;-----',
      'end of data',
    ]);
    expect(reading.profiles[0].dopant).toBe('arsenic');
    expect(reading.warnings).toEqual([]);
  });

  test('takes headings from the last comment line', () => {
    const [profile] = read('# depth_nm  boron_cm3\n1 1e18\n2 2e18\n3 3e18\n').profiles;
    expect(profile.dopant).toBe('boron');
    expect([...profile.depth_um]).toEqual([0.001, 0.002, 0.003]);
  });

  test('reads headings with blanks above columns aligned by blanks', () => {
    const reading = read(
      'Depth (nm)   B (atoms/cc)   As (atoms/cc)\n  1.0   1.0e18   2e17\n  2.0   1.1e18   3e17\n  3.0   1e18     4e17\n',
    );
    expect(reading.choice.delimiter).toBe('space');
    expect(reading.profiles.map((p) => p.dopant)).toEqual(['boron', 'arsenic']);
  });

  test('reads a row of units below the names, and dopant names over pairs of columns', () => {
    const reading = read(
      '11B\t\t75As\t\nDepth\tConc.\tDepth\tConc.\nnm\tatoms/cm3\tµm\tatoms/cm³\n1\t1e18\t0.01\t5e19\n2\t2e18\t0.02\t6e19\n3\t3e18\t0.03\t7e19\n4\t4e18\t\t\n',
    );
    expect(reading.questions).toEqual([]);
    expect(reading.profiles.map((p) => [p.dopant, p.depthColumn, p.concentrationColumn])).toEqual([
      ['boron', 1, 2],
      ['arsenic', 3, 4],
    ]);
    expect([...reading.profiles[0].depth_um]).toEqual([0.001, 0.002, 0.003, 0.004]);
    expect([...reading.profiles[1].depth_um]).toEqual([0.01, 0.02, 0.03]);
    expect(reading.choice.depthUnit).toBeUndefined();
    expect(reading.warnings).toEqual([]);
  });

  test('does not mistake a line of the preamble for names over the columns', () => {
    const reading = read('Operator;Crater\nDepth (nm);B\n1,5;1e18\n2,5;2e18\n3,5;3e18\n', {
      concentrationUnit: 'cm-3',
    });
    expect(reading.columns.map((c) => c.heading)).toEqual(['Depth (nm)', 'B']);
  });

  test('stands a heading as long as a line may be', () => {
    const reading = read(`Depth (nm),B (${'x'.repeat(9900)}\n1,1e18\n2,2e18\n3,3e18\n`);
    expect(reading.columns[1].heading).toHaveLength(200);
    expect(reading.questions.map((q) => q.kind)).toEqual(['concentrationUnit']);
  });

  test('leaves matrix signals, times and counts out of the profiles', () => {
    const reading = read(
      'Time (s),Depth (nm),30Si (c/s),31P (1/cm3),Cycle\n1,1,5000,1e18,1\n2,2,5000,2e18,2\n3,3,5001,3e18,3\n',
    );
    expect(reading.columns.map((c) => c.role)).toEqual(['other', 'depth', 'other', 'concentration', 'other']);
    expect(reading.profiles).toHaveLength(1);
  });

  test('reads quoted fields with delimiters and line breaks inside headings', () => {
    const reading = read('"Depth\n(nm)","B, measured (atoms/cc)"\n"10","1e18"\n"20","2e18"\n"30","3e18"\n');
    expect(reading.profiles[0]).toMatchObject({ dopant: 'boron' });
    expect([...reading.profiles[0].depth_um]).toEqual([0.01, 0.02, 0.03]);
  });

  test('is not led astray by an odd quote in the preamble', () => {
    expect(read(`wafer 5" n-type\n${SIMPLE}`).profiles[0].depth_um).toHaveLength(3);
    expect(read(`"open\n${SIMPLE}`).profiles[0].depth_um).toHaveLength(3);
  });

  test('honours all encodings, with and without byte-order marks', () => {
    const text = 'Depth (µm);B (cm-3)\n1;1e18\n2;2e18\n3;3e18\n';
    for (const [bytes, encoding] of [
      [utf8(text), 'utf-8'],
      [utf8(`\ufeff${text}`), 'utf-8'],
      [latin(text), 'windows-1252'],
      [utf16(`\ufeff${text}`, false), 'utf-16le'],
      [utf16(`\ufeff${text}`, true), 'utf-16be'],
    ] as const) {
      const reading = readTable(bytes);
      expect(reading.choice).toMatchObject({ encoding, depthUnit: 'um' });
      expect(reading.columns[0].heading).toBe('Depth (µm)');
    }
    expect(codes(readTable(latin(text)))).toEqual(['table-encoding']);
    expect(readTable(utf16(text, false), { encoding: 'utf-16le' }).profiles).toHaveLength(1);
  });

  test('leaves out as many lines as chosen', () => {
    const text =
      'Depth (nm),B (cm-3)\n1,1e18\n2,1e18\n3,1e18\n4,1e18\nDepth (nm),B (cm-3)\n7,1e18\n8,1e18\n9,1e18\n';
    const whole = read(text);
    expect(whole.profiles[0].depth_um).toHaveLength(4);
    expect(whole.warnings).toMatchObject([{ code: 'table-other', line: 7 }]);
    expect([...read(text, { skip: 5 }).profiles[0].depth_um]).toEqual([0.007, 0.008, 0.009]);
  });

  test('lets a person name the columns, by position or heading', () => {
    const text = 'a,b,c\n1,5,1e18\n2,6,2e18\n3,7,3e18\n';
    const choice: TableChoice = { depthUnit: 'nm', concentrationUnit: 'cm-3' };
    const reading = read(text, choice, { depth: 'B', concentration: 3 });
    expect([...reading.profiles[0].depth_um]).toEqual([0.005, 0.006, 0.007]);
    expect(read(text, choice, { depth: 'd' }).questions[0]).toMatchObject({
      kind: 'columns',
      options: ['a', 'b', 'c'],
    });
    expect(read(text, choice, { depth: 9 }).questions[0].message).toContain('there is no column 9');
  });
});

describe('readTable: what it asks', () => {
  test('asks for the decimal sign where every comma stands before three digits, and reads both ways when told', () => {
    const text =
      'Depth (nm);B (cm-3)\n1,234;1000000000000000\n2,345;2000000000000000\n3,456;3000000000000000\n';
    const asked = read(text);
    expect(asked.profiles).toEqual([]);
    expect(asked.questions).toMatchObject([{ kind: 'decimal', options: ['.', ','], line: 2 }]);
    expect(asked.preview[0][0]).toBe('1,234');
    expect(read(text, { decimal: ',' }).profiles[0].depth_um[0]).toBe(0.001234);
    expect(read(text, { decimal: '.' }).profiles[0].depth_um[0]).toBe(1.234);
  });

  test('weighs the whole file before it asks: one decisive field far below settles it', () => {
    const rows = Array.from(
      { length: 7000 },
      (_, i) => `${(i % 900) + 1},${String(100 + (i % 900))};1000000000000000`,
    );
    const text = `Depth (nm);B (cm-3)\n${rows.join('\n')}\n`;
    expect(read(text).questions).toHaveLength(1);
    expect(read(`${text}0,435;1000000000000000\n`).choice.decimal).toBe(',');
  });

  test('asks for units that are absent or unknown, once for each kind, and takes the answer', () => {
    expect(read('Depth,B\n1,1e18\n2,2e18\n3,3e18\n').questions.map((q) => q.kind)).toEqual([
      'depthUnit',
      'concentrationUnit',
    ]);
    const unknown = read('Depth (furlong),B (cm-3)\n1,1e18\n2,2e18\n3,3e18\n').questions;
    expect(unknown).toHaveLength(1);
    expect(unknown[0].message).toContain('"furlong"');
    expect(unknown[0].options).toEqual(['nm', 'um', 'A', 'cm']);
    expect(
      read('1,1e18\n2,2e18\n3,3e18\n', { depthUnit: 'A', concentrationUnit: 'm-3' }).profiles[0],
    ).toMatchObject({
      depth_um: Float64Array.of(1e-4, 2e-4, 3e-4),
      concentration_cm3: Float64Array.of(1e12, 2e12, 3e12),
    });
  });

  test('lets a chosen unit win over the heading and says so', () => {
    const reading = read(SIMPLE, { depthUnit: 'um' });
    expect(reading.profiles[0].depth_um[0]).toBe(10);
    expect(codes(reading)).toEqual(['table-unit']);
  });

  test('asks for the columns where only times and counts stand above the numbers', () => {
    expect(read('Time (s),Counts\n1,5\n2,6\n3,7\n').questions[0]).toMatchObject({ kind: 'columns' });
  });
});

describe('readTable: what it tells', () => {
  test('leaves out marks of the detection limit, zeros, negative and missing values, each with count and line', () => {
    const reading = read(
      'Depth (nm),B (cm-3)\n1,1e18\n2,<1e14\n3,0\n4,-5e13\n5,\n6,NaN\n7,2e17\n8,n.d.\n-1,1e18\n',
    );
    expect([...reading.profiles[0].depth_um]).toEqual([0.001, 0.007]);
    expect(reading.profiles[0].belowDetection).toBe(4);
    expect(reading.warnings).toMatchObject([
      { code: 'table-missing', line: 6 },
      { code: 'table-below-detection', line: 3 },
      { code: 'table-zero', line: 4 },
      { code: 'table-negative', line: 5 },
      { code: 'table-depth', line: 10 },
    ]);
    expect(reading.warnings[0].message).toContain('2 of 9 rows');
  });

  test('sorts depths that descend, and averages the logarithms where a depth repeats', () => {
    const reading = read('Depth (nm),B (cm-3)\n3,1e18\n2,1e16\n2,1e18\n1,5e18\n');
    expect([...reading.profiles[0].depth_um]).toEqual([0.001, 0.002, 0.003]);
    expect(reading.profiles[0].concentration_cm3[1] / 1e17).toBeCloseTo(1, 12);
    expect(reading.warnings).toMatchObject([
      { code: 'table-order', line: 3 },
      { code: 'table-repeated', line: 4 },
    ]);
  });

  test('leaves out damaged rows by line and goes on behind them', () => {
    const reading = read(
      'Depth (nm),B (cm-3)\n1,1e18\n2,Infinity\n3,1e999\n4,x\n5\n6,1e18\n7,2e18\n8,3\n9,1e18,4\n',
    );
    expect([...reading.profiles[0].depth_um]).toEqual([0.001, 0.006, 0.007, 0.008]);
    expect(reading.warnings[0]).toMatchObject({ code: 'table-damaged', line: 3 });
    expect(reading.warnings[0].message).toContain('line 4 ("1e999")');
  });

  test('remarks on implausible concentrations and extents', () => {
    expect(codes(read('Depth (um),B (cm-3)\n1,1e8\n2,1e9\n5000,1e9\n'))).toEqual([
      'table-concentration',
      'table-extent',
    ]);
    expect(codes(read('Depth (A),B (cm-3)\n0,1e18\n2,1e19\n5,1e19\n'))).toEqual(['table-extent']);
  });

  test('leaves out a profile without any positive value and keeps the others', () => {
    const reading = read('Depth (nm),B (cm-3),As (cm-3)\n1,0,1e18\n2,0,1e18\n3,0,1e18\n');
    expect(reading.profiles.map((p) => p.dopant)).toEqual(['arsenic']);
    expect(codes(reading)).toEqual(['table-zero', 'table-empty']);
  });
});

describe('readTable: what it refuses, with file, line and what is allowed', () => {
  test.each([
    ['nothing', '', /^t\.csv: the file is empty/],
    ['blank lines', '\n \n\n', /no row with two or more columns of numbers/],
    ['one line', '1,1e18', /only 1 rows/],
    ['a heading alone', 'Depth (nm),B (cm-3)\n', /no table found: no row/],
    ['one column', '1\n2\n3\n4\n', /no table found/],
    ['prose', 'Dear colleague,\nthe table follows\nlater.\n', /no table found/],
    [
      'zeros alone',
      'Depth (nm),B (cm-3)\n1,0\n2,0\n3,0\n',
      /no profile can be used: .*concentration of zero/,
    ],
    ['NaN alone', 'Depth (nm),B (cm-3)\n1,NaN\n2,NaN\n3,NaN\n', /no profile can be used: .*lack a value/],
    [
      'two decimal signs',
      'Depth (nm);B (cm-3)\n1.5;1e18\n2,5;1e18\n3;1e18\n',
      /^t\.csv: line 3: found "2,5", while line 2 has "1\.5"/,
    ],
    [
      'a comma for everything',
      'Depth (nm),B (cm-3)\n0,5,1,5E18\n1,5,1,6E18\n2,5,1,7E18\n',
      /4 fields stand below 2 headings/,
    ],
    ['a control sign', 'a\n\x02\x03,1\n', /line 2: not a text table/],
    ['a zero byte', 'a\x00b', /byte 2 is zero/],
    [
      'an endless line',
      `1,2\n${'1,'.repeat(6000)}\n`,
      /^t\.csv: line 2: the line has 12000 characters; at most 10000/,
    ],
  ])('%s', (_, text, expected) => {
    expect(problem(() => read(text))).toMatch(expected);
  });

  test('a second decimal sign far below the sample is found by line', () => {
    const rows = Array.from({ length: 6000 }, (_, i) => `${i}.5;1e18`);
    expect(problem(() => read(`Depth (nm);B (cm-3)\n${rows.join('\n')}\n6001,5;1e18\n`))).toMatch(
      /line 6002: found "6001,5", while the table uses "\."/,
    );
  });

  test('choices that cannot be followed', () => {
    expect(problem(() => read(SIMPLE, { decimal: ',' }))).toContain(
      'cannot be delimiter and decimal sign at once',
    );
    expect(problem(() => read(SIMPLE, { delimiter: 'pipe' }))).toContain('no table found');
    expect(problem(() => read(SIMPLE, { skip: 1000 }))).toContain('no table found');
    expect(problem(() => readTable(latin('Depth (µm);B\n'), { encoding: 'utf-8' }))).toContain(
      'not valid utf-8',
    );
    expect(problem(() => readTable(utf16('1,2\n3,4\n', false)))).toContain('utf-16le');
  });

  test('never anything but a reading or an InputProblem, whatever the bytes', () => {
    const hostile = fc.oneof(
      fc.uint8Array({ maxLength: 400 }),
      fc.string({ unit: fc.constantFrom(...'0123456789.,;\t |e-<"#\r\nB('), maxLength: 300 }).map(utf8),
    );
    fc.assert(
      fc.property(hostile, (bytes) => {
        try {
          const { profiles, questions } = readTable(bytes);
          expect(profiles.length > 0).toBe(questions.length === 0);
        } catch (error) {
          expect(error).toBeInstanceOf(InputProblem);
        }
      }),
      { numRuns: 2000 },
    );
  });
});

describe('a table of a million rows', () => {
  test('is read whole, and bytes beyond the limit are refused before they are looked at', () => {
    const rows = ['Depth (nm),B (cm-3),As (cm-3)'];
    for (let i = 0; i < 1_000_000; i++)
      rows.push(`${(i * 0.0015).toFixed(4)},${1e18 + i * 1e12},${2e20 - i * 1e13}`);
    const reading = read(rows.join('\n'));
    expect(reading.profiles.map((p) => p.depth_um.length)).toEqual([1_000_000, 1_000_000]);
    expect(reading.profiles[1].concentration_cm3[999_999]).toBe(2e20 - 999_999 * 1e13);
    expect(problem(() => readTable(new Uint8Array(512_000_001)))).toContain('at most 512000000 are read');
  }, 60_000);
});

describe('a table written in any dialect', () => {
  const SIGNS: Record<TableDelimiter, string> = {
    tab: '\t',
    semicolon: ';',
    comma: ',',
    pipe: '|',
    space: '   ',
  };
  const dialect = fc
    .record({
      delimiter: fc.constantFrom<TableDelimiter>('tab', 'semicolon', 'comma', 'pipe', 'space'),
      decimal: fc.constantFrom<'.' | ','>('.', ','),
      end: fc.constantFrom('\n', '\r\n', '\r'),
      encoding: fc.constantFrom('utf-8', 'utf-8-mark', 'utf-16le', 'utf-16be', 'windows-1252'),
      unit: fc.constantFrom('(nm)', '[nm]', '/ nm', ', nm'),
      preamble: fc.constantFrom('', '# invented data', 'Report 7 of wafer "A"'),
    })
    .filter(({ delimiter, decimal }) => !(delimiter === 'comma' && decimal === ','))
    .filter(({ delimiter, unit }) => !(unit.startsWith(',') && delimiter === 'comma'))
    .filter(({ delimiter, unit }) => !(delimiter === 'space' && !/^[([]/.test(unit)));
  const rows = fc.array(
    fc.tuple(
      fc.double({ min: 0.001, max: 50, noNaN: true }),
      fc.double({ min: 1e12, max: 1e22, noNaN: true }),
    ),
    { minLength: 4, maxLength: 40 },
  );

  test('reads back to the last bit, and again the same with the dialect it reported', () => {
    fc.assert(
      fc.property(dialect, rows, ({ delimiter, decimal, end, encoding, unit, preamble }, pairs) => {
        let nm = 0.5;
        const data = pairs.map(([step, c]) => {
          nm += step;
          return [nm, c];
        });
        const lines = [preamble, [`Depth ${unit}`, 'As (cm-3)'].join(SIGNS[delimiter])];
        for (const row of data)
          lines.push(row.map((value) => value.toExponential().replace('.', decimal)).join(SIGNS[delimiter]));
        const text = lines.join(end) + end;
        const bytes =
          encoding === 'utf-16le' || encoding === 'utf-16be'
            ? utf16(`\ufeff${text}`, encoding === 'utf-16be')
            : encoding === 'windows-1252'
              ? latin(text)
              : utf8(encoding === 'utf-8-mark' ? `\ufeff${text}` : text);
        const reading = readTable(bytes);
        expect(reading.questions).toEqual([]);
        expect([...reading.profiles[0].depth_um]).toEqual(data.map(([x]) => x / 1000));
        expect([...reading.profiles[0].concentration_cm3]).toEqual(data.map(([, c]) => c));
        expect(readTable(bytes, reading.choice).profiles).toEqual(reading.profiles);
      }),
      { numRuns: 300 },
    );
  });
});
