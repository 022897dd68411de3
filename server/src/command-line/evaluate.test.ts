import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

const root = path.resolve(import.meta.dirname, '../../..');
const script = path.join(root, 'server/scripts/evaluate.mjs');
const structures = path.join(root, 'structures');
const fixtures = path.join(root, 'tests/fixtures/cif');

interface Run {
  readonly code: number | null;
  readonly lines: readonly Record<string, unknown>[];
  readonly stderr: string;
}

/** Runs the real script, as a person would. */
function evaluate(
  args: readonly string[],
  cwd: string,
  env: Record<string, string> = {},
): Promise<Run> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [script, ...args], {
      cwd,
      env: { ...process.env, npm_lifecycle_event: '', ...env },
    });
    let stdout = '';
    let stderr = '';
    child.stdout.on('data', (chunk) => (stdout += String(chunk)));
    child.stderr.on('data', (chunk) => (stderr += String(chunk)));
    child.on('error', reject);
    child.on('close', (code) => {
      const lines = stdout.split('\n').filter((line) => line !== '');
      resolve({
        code,
        stderr,
        lines: lines.map((line): Record<string, unknown> => JSON.parse(line)),
      });
    });
  });
}

/**
 * M(d₀) and its tolerance. Exact lattices: OEIS A085469 (rock salt), A181152 (caesium chloride), A182566
 * (zinc blende / 4), A182567 (fluorite), numbers of these sequences from memory; cuprite, perovskite and
 * corundum (at the parameters of our file): 45-digit sums with two splitting parameters and a plane-wise
 * sum, agreeing to 30 digits. Others: Johnson & Templeton, J. Chem. Phys. 34 (1961) 2004, rutile 19.080,
 * and handbook tables, wurtzite 4 × 1.641, for slightly other cells, so with a tolerance to match;
 * cadmium iodide at the parameters of our file: an independent Ewald sum, six digits.
 */
const published: Readonly<Record<string, readonly [number, number]>> = {
  'rock-salt': [1.7475645946331821, 1e-13],
  'caesium-chloride': [1.7626747730709884, 1e-13],
  'zinc-blende': [6.552220213555158, 1e-13],
  fluorite: [5.038784879848567, 1e-13],
  antifluorite: [5.038784879848567, 1e-13],
  cuprite: [4.442475209838955, 1e-13],
  perovskite: [24.7549360566794, 1e-13],
  corundum: [24.35466720420216, 1e-11],
  'cadmium-iodide': [4.3855, 2e-6],
  rutile: [19.0803, 3e-3],
  wurtzite: [6.564, 3e-3],
};

const groups: Readonly<Record<string, readonly [string, number, number, number]>> = {
  'rock-salt': ['NaCl', 4, 8, 225],
  'caesium-chloride': ['CsCl', 1, 2, 221],
  'zinc-blende': ['ZnS', 4, 8, 216],
  wurtzite: ['ZnS', 2, 4, 186],
  fluorite: ['CaF2', 4, 12, 225],
  antifluorite: ['Li2O', 4, 12, 225],
  rutile: ['TiO2', 2, 6, 136],
  perovskite: ['SrTiO3', 1, 5, 221],
  spinel: ['MgAl2O4', 8, 56, 227],
  corundum: ['Al2O3', 6, 30, 167],
  cuprite: ['Cu2O', 2, 6, 224],
  'cadmium-iodide': ['CdI2', 1, 3, 164],
  'nickel-arsenide': ['FeS', 2, 4, 194],
  'rhenium-trioxide': ['ReO3', 1, 4, 221],
};
const names = Object.keys(groups);

describe('evaluating the shipped structures', () => {
  let run: Run;
  beforeAll(async () => {
    const files = names.map((name) => `${name}.cif`);
    run = await evaluate([...files, '--tolerance', '1e-13'], structures);
  }, 180_000);

  it('ends with 0 and one line for each, in order, and nothing else', () => {
    expect(run.stderr).toBe('');
    expect(run.code).toBe(0);
    expect(run.lines.map(({ file }) => file)).toEqual(names.map((name) => `${name}.cif`));
  });

  it.each(names)('%s: line in the promised shape', (name) => {
    const line = run.lines.find(({ file }) => file === `${name}.cif`)!;
    expect(Object.keys(line)).toEqual([
      'file',
      'ok',
      'formula',
      'formulaUnitsPerCell',
      'sitesPerCell',
      'volumeA3',
      'spaceGroupNumber',
      'shortestDistanceA',
      'energyEvPerFormulaUnit',
      'madelung',
      'siteCharges',
      'relativeErrorBound',
      'warnings',
    ]);
    expect([
      line['formula'],
      line['formulaUnitsPerCell'],
      line['sitesPerCell'],
      line['spaceGroupNumber'],
    ]).toEqual(groups[name]);
    expect(line['ok']).toBe(true);
    expect(line['relativeErrorBound']).toBeGreaterThan(0);
    expect(line['relativeErrorBound']).toBeLessThan(1e-11);
    expect(Object.keys(line['madelung'] as object)).toEqual([
      'perDistance',
      'perCharge',
      'reduced',
      'perEdge',
    ]);
  });

  it.each(Object.entries(published))(
    '%s: published Madelung constant',
    (name, [value, relative]) => {
      const line = run.lines.find(({ file }) => file === `${name}.cif`)!;
      const { perDistance } = line['madelung'] as { perDistance: number };
      expect(Math.abs(perDistance / value - 1)).toBeLessThan(relative);
    },
  );

  it.each(names)('%s: energy and constants belong together', (name) => {
    const line = run.lines.find(({ file }) => file === `${name}.cif`)!;
    const energyEv = line['energyEvPerFormulaUnit'] as number;
    const { perDistance } = line['madelung'] as { perDistance: number };
    // M(d₀) = −E d₀ / k_e, with d₀ the shortest distance: in these structures a cation–anion one.
    const expected = (-energyEv * (line['shortestDistanceA'] as number)) / COULOMB_EV_ANGSTROM;
    expect(perDistance / expected).toBeCloseTo(1, 12);
  });

  it('gives charges by label and null where a convention means nothing', () => {
    const perovskite = run.lines.find(({ file }) => file === 'perovskite.cif')!;
    expect(perovskite['siteCharges']).toEqual({ Sr1: 2, Ti1: 4, O1: -2 });
    expect(perovskite['madelung']).toMatchObject({ perCharge: null });
  });
});

describe('with a repulsion', () => {
  it('adds lattice energy, bulk modulus, estimate and checks', async () => {
    const asked = ['rock-salt.cif', '--repulsion', 'born-lande', '--exponent', '8'];
    const { code, lines } = await evaluate(asked, structures);
    expect(code).toBe(0);
    const line = lines[0]!;
    // U = E (1 − 1/n), 1 eV = 96.485 332 12 kJ mol⁻¹ (exact SI).
    const expected = (line['energyEvPerFormulaUnit'] as number) * (1 - 1 / 8) * 96.48533212;
    expect(line['latticeEnergyKjPerMol']).toBeCloseTo(expected, 4);
    expect(line['bulkModulusGpa']).toBeGreaterThan(20);
    // 1202.5 · 2/2.83 · (1 − 0.345/2.83) with radii of Na⁺ 1.02 and Cl⁻ 1.81 Å.
    expect(line['kapustinskiiKjPerMol']).toBeCloseTo(-746.22, 2);
    expect(line['checks']).toContainEqual(
      expect.objectContaining({ key: 'charge_balance', word: 'holds' }),
    );
  }, 60_000);
});

describe('files that fail', () => {
  const folder = mkdtempSync(path.join(tmpdir(), 'holdfast-evaluate-'));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  it('do not stop the others; the exit code is 1', async () => {
    writeFileSync(path.join(folder, 'empty.cif'), '');
    const files = [
      'none.cif',
      folder,
      'empty.cif',
      path.join(fixtures, 't17_loop_bad_count.cif'),
      path.join(fixtures, 't09_occ_over_one.cif'),
      path.join(structures, 'rock-salt.cif'),
    ];
    const { code, lines, stderr } = await evaluate(files, folder);
    expect(code).toBe(1);
    expect(stderr).toBe('');
    expect(lines.map(({ file }) => file)).toEqual(files);
    expect(lines.map(({ error }) => (error as { code: string } | undefined)?.code)).toEqual([
      'file.unreadable',
      'file.unreadable',
      'cif.no_structure',
      'cif.loop_count',
      'cell.occupancy',
      undefined,
    ]);
    expect(lines[3]).toMatchObject({ ok: false, error: { line: 16 } });
    expect(lines[5]).toMatchObject({ ok: true, formula: 'NaCl' });
  }, 180_000);

  it('ask for charges that are not neutral or not known', async () => {
    const salt = path.join(fixtures, 't02_hm_nospace.cif');
    const suggested = await evaluate([salt], folder);
    expect(suggested.lines[0]).toMatchObject({ ok: true, siteCharges: { Na: 1, Cl: -1 } });
    expect(suggested.lines[0]!['warnings']).toContainEqual(
      expect.objectContaining({ code: 'cif.charges_suggested' }),
    );
    const given = await evaluate([salt, '--charges', 'Na=2,Cl=-2'], folder);
    expect(given.lines[0]).toMatchObject({ ok: true, siteCharges: { Na: 2, Cl: -2 } });
    const charged = await evaluate([salt, '--charges', 'Na=2,Cl=-1'], folder);
    expect(charged.lines[0]).toMatchObject({ ok: false, error: { code: 'cell.not_neutral' } });
    writeFileSync(path.join(folder, 'alloy.cif'), alloy);
    const unknown = await evaluate(['alloy.cif'], folder);
    expect(unknown.lines[0]).toMatchObject({ ok: false, error: { code: 'cif.charges_needed' } });
    expect((unknown.lines[0]!['error'] as { message: string }).message).toContain('--charges Na=…');
  }, 180_000);

  it('names files relative to where npm was called', async () => {
    const run = await evaluate(['rock-salt.cif'], root, {
      npm_lifecycle_event: 'evaluate',
      INIT_CWD: structures,
    });
    expect(run.code).toBe(0);
    expect(run.lines[0]).toMatchObject({ file: 'rock-salt.cif', ok: true });
  }, 180_000);

  it.each([[[]], [['rock-salt.cif', '--tolerance', '2']], [['rock-salt.cif', '--loud']]])(
    'a wrong call %j ends with 2 and says so on stderr',
    async (args) => {
      const run = await evaluate(args, structures);
      expect(run.code).toBe(2);
      expect(run.lines).toEqual([]);
      expect(run.stderr).toContain('Usage: npm run --silent evaluate');
    },
    180_000,
  );
});

const alloy = `data_alloy
_cell_length_a 4
_cell_length_b 4
_cell_length_c 4
_space_group_name_H-M_alt 'P m -3 m'
loop_
_atom_site_label
_atom_site_fract_x
_atom_site_fract_y
_atom_site_fract_z
Na1 0 0 0
Mg1 .5 .5 .5
`;
