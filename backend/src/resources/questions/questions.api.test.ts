import { ClearanceReply } from '@tiltwright/shared/schemas/clearance.ts';
import { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { PlacementReply } from '@tiltwright/shared/schemas/placement.ts';
import { TiltReply } from '@tiltwright/shared/schemas/tilt.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { currentEdition } from '../catalog/queries.ts';
import { clearanceExample, fitExample, placementsExample, tiltExample } from './examples.ts';

async function catalogIds(agent: Awaited<ReturnType<ReturnType<typeof testApp>['as']>>) {
  const first = async (path: string) => (await agent.get(`/api/v1/${path}`).expect(200)).body.data[0].id as string;
  return {
    hull: await first('hulls?q=reedcutter 14'),
    lowerUnit: await first('lower-units?generic=false'),
    transducer: await first('transducers?generic=true'),
    mount: await first('mounts?q=generic transom bracket'),
  };
}

test('tilt by catalog ids: needed = target − trim, and the bracket reads it less the transom angle', async () => {
  const app = testApp();
  const agent = await app.as('visitor');
  const { hull, mount } = await catalogIds(agent);
  const { trim, tilt, edition } = parsed(
    TiltReply,
    await agent.get('/api/v1/tilt').query({ hull, mount, speedKn: 16, targetDeg: 1 }).expect(200),
  );
  expect(edition).toBe(currentEdition(app.db));
  expect(tilt.neededDeg).toBeCloseTo(1 - trim.valueDeg, 9);
  expect(tilt.attitudeDeg).toBeCloseTo(1, 9);
  const { transomAngleDeg } = (await agent.get(`/api/v1/hulls/${hull}`)).body;
  const { tiltZeroDeg = 0 } = (await agent.get(`/api/v1/mounts/${mount}`)).body;
  expect(tilt.bracketSettingDeg).toBeCloseTo(tilt.neededDeg - transomAngleDeg - tiltZeroDeg, 9);
});

test('an owner’s own measurement is taken as it is', async () => {
  const agent = await testApp().as('visitor');
  const { trim } = parsed(
    TiltReply,
    await agent
      .post('/api/v1/tilt')
      .send({ ...tiltExample, measuredTrimDeg: 5.2, measuredSigmaDeg: 0.4 })
      .expect(200),
  );
  expect(trim).toMatchObject({ valueDeg: 5.2, basis: 'yours' });
});

test('a hull’s trim address and the tilt address agree', async () => {
  const agent = await testApp().as('visitor');
  const { hull } = await catalogIds(agent);
  const byHull = (await agent.get(`/api/v1/hulls/${hull}/trim?speedKn=16`).expect(200)).body;
  const byTilt = (await agent.get('/api/v1/tilt').query({ hull, speedKn: 16 }).expect(200)).body;
  expect(byHull.trim).toEqual(byTilt.trim);
});

test('clearance by ids and by inline records; GET and POST agree', async () => {
  const agent = await testApp().as('visitor');
  const { hull, lowerUnit, transducer } = await catalogIds(agent);
  const place = { offsetMm: 380, dropMm: 5, standoffMm: 30, tiltDeg: -2, motorTrimDeg: 3 };
  const got = parsed(
    ClearanceReply,
    await agent
      .get('/api/v1/clearance')
      .query({ hull, lowerUnit, transducer, ...place })
      .expect(200),
  );
  const posted = parsed(
    ClearanceReply,
    await agent
      .post('/api/v1/clearance')
      .send({ hull, lowerUnit, transducer, ...place })
      .expect(200),
  );
  expect(got).toEqual(posted);
  const inline = parsed(ClearanceReply, await agent.post('/api/v1/clearance').send(clearanceExample).expect(200));
  expect(inline.clearance.port!.clearShare).toBeLessThan(inline.clearance.starboard!.clearShare);
});

test('the short aluminium boat: port side hidden by the motor, starboard clear, defaults named', async () => {
  const agent = await testApp().as('visitor');
  const answer = parsed(FitAnswer, await agent.post('/api/v1/fits').send(fitExample).expect(200));
  expect(answer.ref).toBe('job 12');
  expect(answer.clearance.starboard!.verdict).toBe('clear');
  expect(answer.clearance.port!.verdict).not.toBe('clear');
  expect(answer.clearance.port!.sectors.every(({ by }) => by.unit === 0)).toBe(true);
  expect(answer.assumptions.map(({ field }) => field)).toContain('lowerUnits.0.driveshaftAftMm');
  expect(answer.states.map(({ label }) => label)).toEqual(['cruising']);
});

test('the same question gives the same digest, another place another one', async () => {
  const agent = await testApp().as('visitor');
  const ask = async (body: object) => parsed(FitAnswer, await agent.post('/api/v1/fits').send(body).expect(200)).answerDigest;
  const moved = { ...fitExample, placement: { ...fitExample.placement, offsetMm: 450 } };
  expect(await ask(fitExample)).toBe(await ask(fitExample));
  expect(await ask(moved)).not.toBe(await ask(fitExample));
});

test('an unknown id is named with its place in the question', async () => {
  const agent = await testApp().as('visitor');
  const problem = expectProblem(
    await agent.post('/api/v1/fits').send({ ...fitExample, lowerUnits: [{ lowerUnit: 'low_nothing' }] }),
    'unknown-part',
  );
  expect(problem.issues[0]!.path).toBe('/lowerUnits/0/lowerUnit');
  expectProblem(await agent.get('/api/v1/tilt?hull=hul_nothing&speedKn=10'), 'unknown-part');
});

test.each([
  ['/hull/deadriseDeg', { hull: { ...fitExample.hull, deadriseDeg: 45 } }],
  ['/hull/colour', { hull: { ...fitExample.hull, colour: 'red' } }],
  ['/placement/offsetMm', { placement: { dropMm: 5 } }],
  ['/running/speedKn', { running: { speedKn: 'fast', water: 'fresh' } }],
  ['/placement/bracketSettingDeg', { placement: { ...fitExample.placement, tiltDeg: 1, bracketSettingDeg: 1 } }],
  ['/lowerUnits/0/motorTrimDeg', { lowerUnits: [{ lowerUnit: fitExample.lowerUnits[0]!.lowerUnit, motorTrimDeg: 400 }] }],
])('a wrong value is refused at %s', async (path, wrong) => {
  const agent = await testApp().as('visitor');
  const problem = expectProblem(await agent.post('/api/v1/fits').send({ ...fitExample, ...wrong }), 'invalid-input');
  expect(problem.issues.map((issue) => issue.path)).toContain(path);
});

test('places on the transom: each of the best is as clear as the whole check finds it', async () => {
  const agent = await testApp().as('visitor');
  const question = { ...placementsExample, ref: 'shelf 3' };
  const reply = parsed(PlacementReply, await agent.post('/api/v1/placements').send(question).expect(200));
  expect(reply.ref).toBe('shelf 3');
  expect(reply.best.length).toBeGreaterThan(0);
  const [best] = reply.best;
  const { alsoAt: _alsoAt, ...fit } = fitExample;
  const placement = { ...placementsExample.placement, offsetMm: best!.offsetMm, dropMm: best!.dropMm, tiltDeg: best!.tiltDeg };
  const check = parsed(
    FitAnswer,
    await agent
      .post('/api/v1/fits')
      .send({ ...fit, placement, uncertainty: 'none' })
      .expect(200),
  );
  expect(best!.clearShare.starboard).toBeCloseTo(check.clearance.starboard!.clearShare, 2);
  expect(best!.clearShare.port).toBeCloseTo(check.clearance.port!.clearShare, 2);
});

test('places are searched on a transom, for a side element', async () => {
  const agent = await testApp().as('visitor');
  const ask = (change: object) => agent.post('/api/v1/placements').send({ ...placementsExample, ...change });
  expect(expectProblem(await ask({ mount: { kind: 'in-hull' } }), 'invalid-input').issues[0]!.path).toBe('/mount');
  expect(expectProblem(await ask({ transducer: { kinds: ['down'] } }), 'invalid-input').issues[0]!.path).toBe('/transducer');
});
