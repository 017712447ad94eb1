import { defaultStepPlanSteps, stepPlanSchema, type WireStepPlan, type WireTurn } from '@stubpost/shared';
import { type Railroad, aRailroad, addHarbor, anEntryRequest, openTurn, record } from './support/railroad';

describe('step plans of a terminal', () => {
  let railroad: Railroad;

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
  });
  afterEach(() => railroad.close());

  const list = async (): Promise<WireStepPlan[]> => {
    const answer = await (await railroad.as('dispatcher')).agent.get('/api/terminals/HBR/plans').expect(200);
    return answer.body as WireStepPlan[];
  };
  const put = async (fields: object) =>
    (await railroad.as('supervisor')).agent.post('/api/terminals/HBR/plans').send({
      key: 'push-pull-turn',
      name: 'Push-pull turn, winter',
      effectiveFrom: '2026-03-03',
      steps: defaultStepPlanSteps,
      ...fields,
    });
  const look = async (turn: WireTurn): Promise<WireTurn> =>
    (await (await railroad.as('dispatcher')).agent.get(`/api/turns/${turn.id}`)).body as WireTurn;

  test('begin with the one we ship', async () => {
    const plans = await list();
    expect(plans).toHaveLength(1);
    expect(stepPlanSchema.parse(plans[0])).toEqual(plans[0]);
    expect(plans[0]).toMatchObject({ key: 'push-pull-turn', version: 1, terminal: 'HBR', createdBy: null });
    expect(await list()).toEqual(plans);
  });

  test('are read by id and kept by the browser for good', async () => {
    const [plan] = await list();
    const dispatcher = await railroad.as('dispatcher');
    const answer = await dispatcher.agent.get(`/api/plans/${plan?.id}`).expect(200);
    expect(answer.body).toEqual(plan);
    expect(answer.headers['cache-control']).toContain('immutable');
    await dispatcher.agent.get('/api/plans/none').expect(404);
  });

  test('take over from their service date on, for turns on which nothing has happened', async () => {
    const begun = await openTurn(await railroad.as('dispatcher'), { train: '1' });
    const waiting = await openTurn(await railroad.as('dispatcher'), { train: '2' });
    await record(await railroad.as('conductor'), begun.id, anEntryRequest('arrival', 0));
    const answer = await put({ steps: defaultStepPlanSteps.filter((step) => step.key !== 'running-test') });
    expect(answer.status).toBe(201);
    const plan = answer.body as WireStepPlan;
    expect(plan).toMatchObject({ version: 2, createdBy: (await railroad.as('supervisor')).name });
    expect((await look(begun)).planId).toBe(begun.planId);
    const changed = await look(waiting);
    expect(changed.planId).toBe(plan.id);
    expect(changed.steps.map((step) => step.key)).not.toContain('running-test');
    const later = await put({ effectiveFrom: '2026-03-04', name: 'From tomorrow' });
    expect((await look(waiting)).planId).toBe(plan.id);
    expect((await list()).map((each) => each.id)).toEqual([
      (later.body as WireStepPlan).id,
      plan.id,
      begun.planId,
    ]);
  });

  test('carry the railroad’s own words on a step, plain and not endless', async () => {
    const [first, ...rest] = defaultStepPlanSteps;
    const steps = (instruction: string) => [{ ...first, instruction, inCab: true }, ...rest];
    const answer = await put({ steps: steps('Count aloud.\nSay the cars.') });
    expect(answer.status).toBe(201);
    expect((answer.body as WireStepPlan).steps[0]).toMatchObject({
      instruction: 'Count aloud.\nSay the cars.',
      inCab: true,
    });
    expect((await put({ steps: steps('x'.repeat(2001)) })).status).toBe(400);
  });

  test('are refused when they cannot be carried out, and to all but supervisors', async () => {
    const [first, ...rest] = defaultStepPlanSteps;
    const circle = [{ ...first, after: ['running-test'] }, ...rest];
    const answer = await put({ steps: circle });
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ code: 'plan.invalid' });
    const dispatcher = await railroad.as('dispatcher');
    await dispatcher.agent.post('/api/terminals/HBR/plans').send({}).expect(403);
    expect(await list()).toHaveLength(1);
  });
});
