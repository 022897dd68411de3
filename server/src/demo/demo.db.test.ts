import { afterEach, describe, expect, it } from 'vitest';

import { sessionState } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { annotationList } from '#common/schemas/review';
import { shareList } from '#common/schemas/sharing';
import { passwordWeakness } from '#server/auth/password-rules';
import { signInAs, startTestApp, type TestApp } from '#tests/helpers/app';
import { makeUser } from '#tests/helpers/factories';

import { demoPassword, demoPeople } from './demo-people.js';
import { DemoService } from './demo.service.js';
import { DemoStoryService } from './demo-story.service.js';

const apps: TestApp[] = [];
afterEach(async () => {
  await Promise.all(apps.splice(0).map((app) => app.close()));
});

async function start(demo: boolean): Promise<TestApp> {
  const app = await startTestApp({ demo });
  apps.push(app);
  return app;
}

async function readNotice(app: TestApp) {
  return sessionState.parse((await app.browser().get('/api/session').expect(200)).body).demo;
}

/** Makes the demo again, as another start of the server would. */
async function makeAgain(app: TestApp): Promise<void> {
  Object.assign(app.app.get(DemoService), { config: { isDemo: true } });
  await app.app.get(DemoService).onApplicationBootstrap();
}

async function countUsers(app: TestApp): Promise<number> {
  const { rows } = await app.db.execute<{ n: number }>('select count(*)::int as n from users');
  return rows[0]!.n;
}

const shelf = '/api/workspaces/kiln-lane/lattices';

describe('the demo', () => {
  it('stands at the first start, with people of every role to sign in as', async () => {
    const app = await start(true);
    const notice = await readNotice(app);
    expect(notice).toMatchObject({ workspaceName: 'Kiln Lane', password: demoPassword });
    const roles = new Set(notice!.people.map(({ role }) => role));
    expect([...roles].sort()).toEqual(['crystallographer', 'owner', 'reader', 'reviewer']);
    for (const { email } of notice!.people) {
      expect(email).toMatch(/\.example$/);
      const agent = await signInAs(app, email, notice!.password);
      await agent.get(shelf).expect(200);
    }
  });

  it('has every cell of its story, and the states a group meets', async () => {
    const app = await start(true);
    const agent = await signInAs(app, demoPeople[0]!.email, demoPassword);
    const { items, total } = shelfPage.parse((await agent.get(shelf)).body);
    expect(total).toBe(11);
    const formulas = new Set(items.map(({ formula }) => formula));
    expect([...formulas].sort()).toEqual(
      ['Al2O3', 'CaF2', 'CsCl', 'LiF', 'MgAl2O4', 'MgO', 'SrTiO3', 'TiO2', 'ZnS'].sort(),
    );
    const states = new Set(items.map(({ state }) => state));
    expect([...states].sort()).toEqual(['accepted', 'draft', 'in_review', 'returned']);
    const broken = items.filter(({ problemCode }) => problemCode !== null);
    expect(broken).toMatchObject([{ problemCode: 'cell.not_neutral', formula: 'CaF2' }]);
    const periclase = items.find(({ name }) => name === 'Periclase, trial 3')!;
    expect(periclase.energyEvPerFormulaUnit!.value.toFixed(5)).toBe('-47.79546');
    const returned = items.find(({ state }) => state === 'returned')!;
    const remarks = annotationList.parse(
      (await agent.get(`${shelf}/${returned.id}/revisions/1/annotations`)).body,
    );
    expect(remarks.items.length).toBeGreaterThan(1);
    const accepted = items.find(({ state }) => state === 'accepted')!;
    const links = shareList.parse((await agent.get(`${shelf}/${accepted.id}/shares`)).body);
    expect(links.items).toHaveLength(1);
  });

  it('is made once', async () => {
    const app = await start(true);
    await makeAgain(app);
    expect(await countUsers(app)).toBe(demoPeople.length);
  });

  it('is made anew where a start was cut short', async () => {
    const app = await start(false);
    const story = app.app.get(DemoStoryService);
    const play = story.play.bind(story);
    story.play = async (cast) => {
      await play(cast);
      throw new Error('cut short');
    };
    await expect(makeAgain(app)).rejects.toThrow('cut short');
    expect(await countUsers(app)).toBe(demoPeople.length);
    expect(await readNotice(app)).toBeNull();
    story.play = play;
    await makeAgain(app);
    expect(await countUsers(app)).toBe(demoPeople.length);
    const agent = await signInAs(app, demoPeople[1]!.email, demoPassword);
    expect((await agent.get(shelf)).body.total).toBe(11);
  });

  it('is made once by servers that start together', async () => {
    const app = await start(false);
    await Promise.all([makeAgain(app), makeAgain(app), makeAgain(app)]);
    expect(await countUsers(app)).toBe(demoPeople.length);
  });

  it('leaves a server alone that someone uses, and one that asks for none', async () => {
    const app = await start(false);
    expect(await countUsers(app)).toBe(0);
    await makeUser(app.db);
    await makeAgain(app);
    expect(await countUsers(app)).toBe(1);
    expect(await readNotice(app)).toBeNull();
  });

  it('has a password the product would take', () => {
    for (const person of demoPeople) {
      expect(passwordWeakness(demoPassword, person)).toBeNull();
    }
  });
});
