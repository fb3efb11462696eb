import { spawn, spawnSync } from 'node:child_process';
import {
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import {
  biasSweep,
  columnsTable,
  parseStudy,
  rangeStatistics,
  solve,
  studyJsonSchema,
} from '../../src/core/index';
import { builtCommandLine, type CommandLine } from './call';

const RESISTOR = 'demo-profiles/p-resistor.json';
const RESULT = solve(parseStudy(readFileSync(RESISTOR, 'utf8'))).result;

let call: CommandLine;
let end: () => void;
let folder: string;

beforeAll(async () => {
  ({ call, end } = await builtCommandLine());
}, 60_000);
afterAll(() => end());
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'ohmstrata-files-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

function put(name: string, content: unknown): string {
  const path = join(folder, name);
  writeFileSync(
    path,
    typeof content === 'string' || content instanceof Buffer ? content : JSON.stringify(content),
  );
  return path;
}

const studyWith = (parts: object) => ({
  format: 'ohmstrata-study/1',
  wafer: { dopant: 'phosphorus', concentration_cm3: 1e15 },
  ...parts,
});
const tableStep = (file: string) => studyWith({ steps: [{ step: 'table', dopant: 'boron', file }] });

/** One line of words on standard error, nothing on standard output, exit code 2. */
function expectRefused(ended: ReturnType<CommandLine>, ...words: (string | RegExp)[]): void {
  expect(ended.stdout).toBe('');
  expect(ended.stderr.trimEnd().split('\n')).toHaveLength(1);
  for (const word of words) expect(ended.stderr).toMatch(word);
  expect(ended.status).toBe(2);
}

describe('solve', () => {
  test('prints layers, junctions and the comparison with what was measured', () => {
    const { stdout, stderr, status } = call(['solve', RESISTOR]);
    expect(status).toBe(0);
    const [layer] = RESULT.layers;
    const [junction] = RESULT.junctions;
    const digits = (value: number | null) => String(Number(value?.toPrecision(4))).replace('.', '\\.');
    expect(stdout).toMatch(
      new RegExp(`^1 p +0 +${digits(layer.bottom_um)} +${digits(layer.sheetResistance_ohmSq)} `, 'm'),
    );
    expect(stdout).toMatch(
      new RegExp(`^1 +${digits(junction.metallurgical_um)} +${digits(junction.electrical_um)} `, 'm'),
    );
    expect(stdout).toMatch(new RegExp(`^four-point +1 +2390 +${digits(layer.sheetResistance_ohmSq)} `, 'm'));
    expect(stderr).toMatch(/^warning: step 1: .*amorphous/);
  });

  test('prints the result document of the same calculation with --json', () => {
    const { stdout, stderr } = call(['solve', RESISTOR, '--json']);
    expect(stderr).toBe('');
    expect(JSON.parse(stdout)).toEqual(
      JSON.parse(JSON.stringify(solve(parseStudy(readFileSync(RESISTOR, 'utf8'))).result)),
    );
  });

  test('writes every column against depth with --profile, to the last bit', () => {
    const out = join(folder, 'columns.csv');
    expect(call(['solve', RESISTOR, '--profile', out]).status).toBe(0);
    const lines = readFileSync(out, 'utf8').trimEnd().split('\n');
    const head = lines.findIndex((line) => !line.startsWith('#'));
    const { header, columns } = columnsTable(solve(parseStudy(readFileSync(RESISTOR, 'utf8'))));
    expect(lines[head].split(',')).toEqual(header);
    const rows = lines.slice(head + 1).map((line) => line.split(','));
    for (const [k, column] of columns.entries())
      expect(rows.map((row) => (row[k] === '' ? Number.NaN : Number(row[k])))).toEqual([...column]);
    expect(readdirSync(folder)).toEqual(['columns.csv']);
  });

  test('reads a study from standard input', () => {
    const { stdout, status } = call(['solve', '-'], { input: readFileSync(RESISTOR) });
    expect(status).toBe(0);
    expect(stdout).toBe(call(['solve', RESISTOR]).stdout);
  });

  test('takes the tables a study names from the study’s own folder, and says what was left out', () => {
    const { stdout, stderr, status } = call(['solve', join(process.cwd(), 'demo-profiles/sims-pair.json')], {
      cwd: folder,
    });
    expect(status).toBe(0);
    expect(stdout).toMatch(/^2 p /m);
    expect(stderr).toMatch(/sims-arsenic-boron\.txt: line 128: .*below detection/);
  });

  test('ends quietly when its reader closes the pipe', async () => {
    const child = spawn('sh', ['-c', `"${process.execPath}" "${call.entry}" schema | head -1`], {
      stdio: 'pipe',
    });
    let stderr = '';
    child.stderr.on('data', (data) => {
      stderr += data;
    });
    await new Promise((done) => child.on('close', done));
    expect(stderr).toBe('');
  });
});

describe('a study that cannot be used ends in one line, exit code 2, and nothing written', () => {
  test.each<[string, string | Buffer, ...RegExp[]]>([
    ['empty', '', /empty/],
    ['no JSON', '{ "format": ', /not valid JSON/],
    ['a list', '[]', /study/],
    ['of another format', '{"format":"ohmstrata-study/9"}', /format version 9/, /reads version 1/],
    ['binary', Buffer.from([0xff, 0xfe, 0, 1, 2, 0x80]), /UTF-8/],
    ['with a mistyped key', JSON.stringify(studyWith({ temprature_C: 25 })), /temprature_C/, /temperature_C/],
    ['with an absurd value', JSON.stringify(studyWith({ temperature_C: 1e9 })), /temperature_C/, /226\.85/],
    [
      'with a wrong step',
      JSON.stringify(
        studyWith({ steps: [{ step: 'implant', dopant: 'boron', dose_cm2: -1, energy_keV: 60 }] }),
      ),
      /steps\[0\]\.dose_cm2/,
    ],
  ])('%s', (_what, text, ...words) => {
    const path = put('bad.json', text);
    const out = join(folder, 'columns.csv');
    expectRefused(call(['solve', path, '--profile', out]), /bad\.json/, ...words);
    expectRefused(call(['check', path]), /bad\.json/, ...words);
    expect(readdirSync(folder)).toEqual(['bad.json']);
  });

  test('one that does not exist, is a folder, or is a pipe that nobody feeds', () => {
    expectRefused(
      call(['solve', join(folder, 'none.json')]),
      /none\.json: cannot be read: there is no such file/,
    );
    expectRefused(call(['solve', folder]), /it is a folder/);
    spawnSync('mkfifo', [join(folder, 'pipe.json')]);
    expectRefused(call(['solve', join(folder, 'pipe.json')]), /it is not a file/);
  });

  test('one too large is not even read', () => {
    const path = put('large.json', Buffer.alloc(8 * 2 ** 20 + 1, 32));
    expectRefused(call(['solve', path]), /larger than the 8 MB/);
  });

  test.each(['../outside.csv', '/etc/hostname', 'C:\\outside.csv', '..', 'a/b.csv'])(
    'one that names the table %s',
    (name) => {
      mkdirSync(join(folder, 'inner'));
      put('outside.csv', 'depth (nm),B (cm-3)\n1,1e18\n2,1e17\n');
      const path = put('inner/study.json', tableStep(name));
      expectRefused(call(['solve', path]), /steps\[0\]\.file/, /own folder/);
    },
  );

  test('one whose table is a link that leads out of its folder', () => {
    mkdirSync(join(folder, 'inner'));
    put('outside.csv', 'depth (nm),B (cm-3)\n1,1e18\n2,1e17\n');
    symlinkSync(join(folder, 'outside.csv'), join(folder, 'inner/table.csv'));
    expectRefused(call(['solve', put('inner/study.json', tableStep('table.csv'))]), /link that leads out/);
  });

  test('one whose table leaves a question open: the line, the key and what is allowed', () => {
    put('table.csv', 'depth,B\n1,1e18\n2,1e17\n3,1e16\n');
    const ended = call(['solve', put('study.json', tableStep('table.csv'))]);
    expectRefused(ended, /table\.csv/, /reading\.depthUnit/, /nm.*um/);
  });

  test('a file that cannot be written leaves the answer unprinted', () => {
    expectRefused(call(['solve', RESISTOR, '--profile', join(folder, 'none/out.csv')]), /cannot be written/);
    expectRefused(call(['solve', RESISTOR, '--profile', folder]), /it is a folder/);
  });

  test('the stack is shown with --trace only', () => {
    const path = put('bad.json', '{}');
    expect(call(['solve', path]).stderr).not.toMatch(/\n {4}at /);
    expect(call(['solve', path, '--trace']).stderr).toMatch(/\n {4}at /);
  });
});

describe('resistivity', () => {
  test('of a concentration, with the standard beside the model', () => {
    const { stdout } = call(['resistivity', '--dopant', 'boron', '--concentration', '1e16', '--json']);
    const found = JSON.parse(stdout);
    // SEMI MF723, boron: 1.305e16/N + 1.133e17/{N [1 + (2.58e-19 N)^-0.737]}; Klaassen at 25 C stays within 3 % of it.
    expect(found.mf723Resistivity_ohmCm).toBeCloseTo(1.305 + 11.33 / (1 + 2.58e-3 ** -0.737), 9);
    expect(found.resistivity_ohmCm / found.mf723Resistivity_ohmCm).toBeGreaterThan(0.97);
    expect(found.resistivity_ohmCm / found.mf723Resistivity_ohmCm).toBeLessThan(1.03);
    expect(found.concentration_cm3).toBe(1e16);
    expect(found.mobility_cm2Vs).toBeGreaterThan(400);
  });

  test('and back, with a unit typed and the dopant by its symbol', () => {
    const there = JSON.parse(
      call(['resistivity', '--dopant', 'P', '--concentration', '1e21 m-3', '--json']).stdout,
    );
    const back = JSON.parse(
      call(['resistivity', '--dopant', 'p', '--resistivity', String(there.resistivity_ohmCm), '--json'])
        .stdout,
    );
    expect(there.concentration_cm3).toBe(1e15);
    expect(back.concentration_cm3 / 1e15).toBeCloseTo(1, 9);
  });

  test('that no doping has ends with exit code 3, why, and what can be reached', () => {
    const ended = call(['resistivity', '--dopant', 'boron', '--resistivity', '1e6']);
    expect(ended.status).toBe(3);
    expect(ended.stdout).toBe('');
    expect(ended.stderr).toMatch(/no solution: .*can be reached/);
  });

  test('asks for one of concentration and resistivity', () => {
    expectRefused(call(['resistivity', '--dopant', 'boron']), /either --concentration or --resistivity/);
    expectRefused(
      call(['resistivity', '--dopant', 'boron', '--concentration', '1e15', '--resistivity', '3']),
      /either/,
    );
  });
});

describe('range', () => {
  test('gives the moments with their units in the names', () => {
    const found = JSON.parse(call(['range', '--ion', 'B', '--energy', '60', '--json']).stdout);
    const expected = rangeStatistics({
      species: 'boron',
      energy_keV: 60,
      target: 'silicon',
      set: 'universal',
    });
    expect(found.projectedRange_um).toBeCloseTo(expected.projectedRange * 1e4, 12);
    expect(found.straggle_um).toBeCloseTo(expected.straggle * 1e4, 12);
    expect(found.lateralStraggle_um).toBeCloseTo(expected.lateralStraggle * 1e4, 12);
    expect(found).toMatchObject({ skewness: expected.skewness, kurtosis: expected.kurtosis, ion: 'boron' });
  });

  test('takes the tables of 1975 and another target', () => {
    const { stdout, status } = call([
      'range',
      '--ion',
      'As',
      '--energy',
      '0.1 MeV',
      '--target',
      'oxide',
      '--ranges',
      'lss1975',
    ]);
    expect(status).toBe(0);
    expect(stdout).toMatch(/^arsenic, 100 keV, into oxide \(lss1975 ranges, fits or tables\)$/m);
  });

  test('solves the transport equation for any element and target, and for dopants as the fits have it', () => {
    const solved = JSON.parse(call(['range', '--ion', 'P', '--energy', '80', '--solve', '--json']).stdout);
    const fitted = JSON.parse(call(['range', '--ion', 'P', '--energy', '80', '--json']).stdout);
    expect(solved.projectedRange_um / fitted.projectedRange_um).toBeCloseTo(1, 2);
    const resist = call(['range', '--ion', 'Ge', '--energy', '120', '--target', 'photoresist', '--solve']);
    expect(resist.status).toBe(0);
    expect(resist.stdout).toMatch(/^Ge, 120 keV, into photoresist \(universal ranges, solved\)$/m);
    const without = call(['range', '--ion', 'Ge', '--energy', '120']);
    expect([without.status, without.stdout]).toEqual([2, '']);
    expect(without.stderr).toMatch(/add --solve/);
  });

  test('names what is allowed', () => {
    const wrong = call(['range', '--ion', 'Xe', '--energy', '60']);
    expect(wrong.status).toBe(2);
    expect(wrong.stderr).toMatch(/Allowed are boron \(B\), .*BF2/);
    expect(call(['range', '--ion', 'B', '--energy', '60 kg']).stderr).toMatch(/keV/);
    expect(call(['range', '--ion', 'B', '--energy', '1e9']).stderr).toMatch(/0\.1 to 10000 keV/);
    expect(call(['range', '--ion', 'B', '--energy', '60', '--target', 'steel']).stderr).toMatch(
      /silicon, oxide, nitride/,
    );
  });
});

describe('temperature and bias', () => {
  test('temperature prints the coefficients and the table, and writes it', () => {
    const out = join(folder, 'temperature.csv');
    const { stdout, status } = call(['temperature', RESISTOR, '--points', '5', '--out', out]);
    expect(status).toBe(0);
    expect(stdout).toMatch(/^layer +reference_ohmSq +TC1_ppmK +TC2_ppmK2 +worst_percent$/m);
    const rows = readFileSync(out, 'utf8').trimEnd().split('\n').slice(-6);
    expect(rows[0]).toBe('temperature_C,layer1p_ohmSq,layer2n_ohmSq');
    expect(rows.slice(1).map((row) => Number(row.split(',')[0]))).toEqual([-55, -10, 35, 80, 125]);
  });

  test('temperature of a model without it ends with exit code 3', () => {
    const ended = call(['temperature', 'demo-profiles/n-plus.json']);
    expect([ended.status, ended.stdout]).toEqual([3, '']);
    expect(ended.stderr).toMatch(/knows one temperature only/);
  });

  test('bias gives the document of the core', () => {
    const { stdout } = call(['bias', RESISTOR, '--layer', '1', '--to', '5', '--points', '3', '--json']);
    const expected = biasSweep(parseStudy(readFileSync(RESISTOR, 'utf8')), {
      layer: 1,
      junctions: 'both',
      from_V: 0,
      to_V: 5,
      points: 3,
    });
    expect(JSON.parse(stdout)).toEqual(JSON.parse(JSON.stringify(expected)));
  });

  test('bias of a layer without junctions ends with exit code 3', () => {
    const ended = call(['bias', 'demo-profiles/film-on-insulator.json', '--layer', '1']);
    expect([ended.status, ended.stdout]).toEqual([3, '']);
  });
});

describe('import', () => {
  const wafer = ['--wafer', 'P', '--concentration', '1.3e15'];

  test('turns a table into a study that solves', () => {
    const { stdout, stderr, status } = call(['import', 'demo-profiles/sims-boron.csv', ...wafer]);
    expect(status).toBe(0);
    expect(stderr).toMatch(/column 2 "11B \(atoms\/cm3\)": boron, 321 depths/);
    const study = parseStudy(stdout);
    expect(study.steps).toMatchObject([
      { step: 'table', dopant: 'boron', source: { name: 'sims-boron.csv' } },
    ]);
    expect(call(['solve', '-'], { input: stdout }).stdout).toMatch(/^1 p /m);
  });

  test('writes the study to a file', () => {
    const out = join(folder, 'study.json');
    const { stdout, status } = call([
      'import',
      'demo-profiles/sims-arsenic-boron.txt',
      ...wafer,
      '--out',
      out,
    ]);
    expect([stdout, status]).toEqual(['', 0]);
    expect(
      parseStudy(readFileSync(out, 'utf8')).steps.map((step) => 'dopant' in step && step.dopant),
    ).toEqual(['arsenic', 'boron']);
  });

  test('asks what the table does not say, and takes the answer as an option', () => {
    const path = put('table.csv', 'depth,B\n1,1e18\n20,1e17\n30,1e16\n');
    expectRefused(call(['import', path, ...wafer]), /table\.csv/, /state it with --depth-unit/);
    const units = ['--depth-unit', 'nm', '--concentration-unit', 'cm-3'];
    expect(call(['import', path, ...wafer, ...units]).status).toBe(0);
  });

  test('refuses what is no table', () => {
    expectRefused(call(['import', put('empty.csv', ''), ...wafer]), /empty\.csv/);
    expectRefused(call(['import', put('binary.csv', Buffer.alloc(4000, 1)), ...wafer]), /binary\.csv/);
  });
});

describe('check, schema, help', () => {
  test('check says that a study is valid and what it holds', () => {
    const { stdout, status } = call(['check', 'demo-profiles/npn-stack.json']);
    expect(status).toBe(0);
    expect(stdout).toMatch(/^demo-profiles\/npn-stack\.json: a valid study, ".*", with 5 steps$/m);
  });

  test('check --json gives the problem as a document too', () => {
    const ended = call(['check', put('bad.json', studyWith({ temperature_C: 1e9 })), '--json']);
    expect(JSON.parse(ended.stdout)).toMatchObject({ ok: false, key: 'temperature_C' });
    expect(ended.status).toBe(2);
  });

  test('schema prints the schema of the definition that validates', () => {
    expect(JSON.parse(call(['schema']).stdout)).toEqual(JSON.parse(JSON.stringify(studyJsonSchema())));
  });

  test.each([
    [],
    ['solve'],
    ['resistivity'],
    ['range'],
    ['history'],
    ['temperature'],
    ['bias'],
    ['import'],
    ['check'],
    ['schema'],
  ])('help of "%s" has examples', (...command) => {
    const { stdout, status } = call([...command, '--help']);
    expect(status).toBe(0);
    expect(stdout).toMatch(/Examples?:\n {2}\$ ohmstrata /);
  });

  test('a mistyped command or option is answered with the nearest one', () => {
    expect(call(['slove', RESISTOR])).toMatchObject({ status: 2, stdout: '' });
    expect(call(['slove', RESISTOR]).stderr).toMatch(/Did you mean solve\?/);
    expect(call(['solve', RESISTOR, '--jsno']).stderr).toMatch(/Did you mean --json\?/);
  });

  test('without a command the help is printed', () => {
    const { stderr, status } = call([]);
    expect(stderr).toMatch(/Usage: ohmstrata/);
    expect(status).toBe(2);
  });
});
