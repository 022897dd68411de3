import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { latticeReport, type LatticeReport, type ReportTable } from '#common/schemas/report';
import { evaluationResult } from '#common/schemas/evaluation';
import { createdShare } from '#common/schemas/sharing';
import { plainNumberText } from '#common/units/format';
import { reportPdf } from '#server/energetics/report/pdf/report-pdf';
import { signIn, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { rockSalt } from '#tests/helpers/cells';
import { latticesPath, makeLattice, makeRevision, saveRevision } from '#tests/helpers/lattices';

let test: TestApp;
let maker: SignedIn;
let lattice: string;
let folder: string;
beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'report-'));
  test = await startTestApp();
  maker = await signIn(test, 'crystallographer');
  lattice = await makeRevision(maker.agent, maker.workspace);
});
afterAll(async () => {
  await test.close();
  rmSync(folder, { recursive: true, force: true });
});

async function reportOf(address = lattice): Promise<LatticeReport> {
  const { body } = await maker.agent.get(`${address}/revisions/1/report`).expect(200);
  return latticeReport.parse(body);
}

async function pdfOf(address = `${lattice}/revisions/1/report.pdf`, agent = maker.agent) {
  const response = await agent.get(address).buffer(true).expect(200);
  expect(response.headers['content-type']).toBe('application/pdf');
  return response.body as Buffer;
}

/** Reads a PDF with a Poppler tool (Debian package poppler-utils). */
function poppler(tool: string, pdf: Buffer, ...options: string[]): string {
  const file = path.join(folder, 'report.pdf');
  writeFileSync(file, pdf);
  const output = tool === 'pdftotext' ? ['-'] : [];
  return execFileSync(tool, [...options, file, ...output], { encoding: 'utf8' });
}

const raised = new Map(
  [...'⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻₀₁₂₃₄₅₆₇₈₉'].map((sign, at) => [sign, [...'0123456789+−0123456789'][at]!]),
);
const spelled: readonly [string, string][] = [
  ['α', 'alpha'],
  ['β', 'beta'],
  ['γ', 'gamma'],
  ['ρ', 'rho'],
  ['ν', 'nu'],
  ['Δ', 'Delta'],
  ['Σ', 'Sum'],
  ['→', 'to'],
];

/** Text as one can compare it: raised signs on the line, no spaces, Greek spelled. */
function bare(text: string): string {
  const plain = spelled.reduce((words, [sign, name]) => words.replaceAll(sign, name), text);
  return [...plain]
    .map((sign) => raised.get(sign) ?? sign)
    .join('')
    .replace(/\s+/g, '');
}

const tablesOf = (report: LatticeReport): ReportTable[] =>
  report.sections.flatMap(({ blocks }) =>
    blocks.flatMap((block) => (block.kind === 'table' ? [block.table] : [])),
  );

describe('the report of a revision', () => {
  it('says what the revision and its evaluation say', async () => {
    const report = await reportOf();
    const revision = (await maker.agent.get(`${lattice}/revisions/1`)).body;
    const result = evaluationResult.parse(revision.evaluation.result);
    expect(report).toMatchObject({
      title: 'Periclase',
      formula: 'MgO',
      revision: 1,
      state: 'draft',
      author: maker.user.name,
      contentHash: revision.evaluation.hash,
      review: 'Not submitted for review',
    });
    const all = report.sections.flatMap(({ blocks }) =>
      blocks.flatMap((block) => (block.kind === 'figures' ? block.figures : [])),
    );
    const figure = (name: string) => all.find((one) => one.name.startsWith(name))!;
    expect(figure('Electrostatic energy').value).toBe(result.energyEvPerFormulaUnit.value);
    expect(figure('Reduced Madelung').value).toBe(result.madelung.reduced.value);
    expect(figure('Volume').value).toBeCloseTo(result.volumeA3, 9);
    for (const one of all.filter(({ bound }) => bound !== null)) {
      const error = Math.abs(Number(plainNumberText(one.text)) - one.value!);
      const decimals = one.text.split('.')[1]?.replaceAll('\u2009', '').length ?? 0;
      expect(error, one.name).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-9));
    }
    // Rock salt: six unlike neighbours at half the edge (4.212 Å), per formula unit.
    const ledger = tablesOf(report).find(({ columns }) => columns[0]?.title === 'Pair')!;
    expect(ledger.rows[0]!.slice(0, 3)).toEqual(['Mg²⁺ – O²⁻', '2.1060', '6']);
    expect(ledger.rows).toHaveLength(result.pairLedger.rows.length);
  });

  it('prints every figure and every cell of every table in the PDF', async () => {
    const report = await reportOf();
    const text = bare(poppler('pdftotext', await pdfOf(), '-raw'));
    const figures = report.sections.flatMap(({ blocks }) =>
      blocks.flatMap((block) => (block.kind === 'figures' ? block.figures : [])),
    );
    expect(figures.length).toBeGreaterThan(15);
    const missing = figures
      .map(({ text: digits, unit }) => bare(`${digits}${unit}`))
      .filter((digits) => !text.includes(digits));
    expect(missing).toEqual([]);
    const rows = tablesOf(report).flatMap(({ rows: lines, closing }) => [...lines, ...closing]);
    expect(rows.length).toBeGreaterThan(10);
    expect(rows.map((row) => bare(row.join(''))).filter((row) => !text.includes(row))).toEqual([]);
    expect(text).toContain(bare(report.contentHash!));
    expect(text).toContain(bare(report.address!));
  });

  it('is A4 with its fonts embedded, a title, an author and page numbers', async () => {
    const pdf = await pdfOf();
    const info = poppler('pdfinfo', pdf);
    expect(info).toMatch(/Title:\s+Periclase, revision 1/);
    expect(info).toContain(`Author:          ${maker.user.name}`);
    expect(info).toMatch(/Page size:\s+595\.28 x 841\.89 pts \(A4\)/);
    const pages = Number(/Pages:\s+(\d+)/.exec(info)?.[1]);
    expect(pages).toBeGreaterThanOrEqual(2);
    expect(pages).toBeLessThanOrEqual(5);
    expect(poppler('pdftotext', pdf)).toContain(`page ${pages} of ${pages}`);
    const fonts = poppler('pdffonts', pdf).trim().split('\n').slice(2);
    expect(fonts.length).toBeGreaterThanOrEqual(2);
    for (const font of fonts) {
      expect(font).toMatch(/SpaceGrotesk\S*\s+CID.*\syes\s+yes\s+yes/);
    }
  });

  it('gives the same bytes for the same report', async () => {
    const report = await reportOf();
    expect((await reportPdf(report)).equals(await reportPdf(report))).toBe(true);
  });

  it('prints any name', async () => {
    const name = 'Łódź 氷 β-MgO 🧊 ﬁ Å\u202e';
    const { id } = await makeLattice(maker.agent, maker.workspace, { name });
    const address = `${latticesPath(maker.workspace)}/${id}`;
    await saveRevision(maker.agent, address);
    const text = poppler('pdftotext', await pdfOf(`${address}/revisions/1/report.pdf`));
    expect(text).toContain('Łódź [U+6C37] beta-MgO');
    expect((await reportOf(address)).title).toBe((await maker.agent.get(address)).body.name);
  });

  it('tells why there are no numbers where the cell can’t be evaluated', async () => {
    const cell = rockSalt();
    const charged = { ...cell, sites: cell.sites.map((site) => ({ ...site, charge: '2' })) };
    const address = await makeRevision(maker.agent, maker.workspace, charged);
    const report = await reportOf(address);
    expect(report.contentHash).toBeNull();
    const { evaluationProblem } = (await maker.agent.get(`${address}/revisions/1`)).body;
    const text = poppler('pdftotext', await pdfOf(`${address}/revisions/1/report.pdf`));
    expect(bare(text)).toContain(bare(evaluationProblem.message));
  });
});

describe('who gets a report', () => {
  it.each(['reader', 'reviewer', 'crystallographer', 'owner'] as const)('%s', async (role) => {
    const { agent } = await signIn(test, role, maker.workspace);
    await agent.get(`${lattice}/revisions/1/report`).expect(200);
    await pdfOf(`${lattice}/revisions/1/report.pdf`, agent);
  });

  it('nobody for what is not there or not theirs', async () => {
    const stranger = await signIn(test, 'owner');
    for (const tail of ['report', 'report.pdf']) {
      await maker.agent.get(`${lattice}/revisions/2/${tail}`).expect(404);
      await maker.agent.get(`${lattice}/revisions/x/${tail}`).expect(404);
      await stranger.agent.get(`${lattice}/revisions/1/${tail}`).expect(404);
      const foreign = lattice.replace(maker.workspace.slug, stranger.workspace.slug);
      await stranger.agent.get(`${foreign}/revisions/1/${tail}`).expect(404);
      await test.browser().get(`${lattice}/revisions/1/${tail}`).expect(401);
    }
  });

  it('the holder of a link, without remarks and address', async () => {
    const made = await maker.agent.post(`${lattice}/revisions/1/shares`).send({}).expect(201);
    const { token } = createdShare.parse(made.body);
    const address = `/api/shares/${token}/report.pdf`;
    const response = await test.browser().get(address).buffer(true).expect(200);
    expect(response.headers['cache-control']).toBe('no-store');
    const text = poppler('pdftotext', response.body as Buffer);
    expect(text).toContain('Periclase');
    expect(text).not.toContain('/w/');
    expect(text).not.toContain('Remarks');
    await test
      .browser()
      .get(`/api/shares/${'A'.repeat(43)}/report.pdf`)
      .expect(404);
  });
});
