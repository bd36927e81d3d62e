import { describe, expect, it } from 'vitest';
import { findStepCycle } from '../../../shared/engine/step-order.ts';
import { computeTimes } from '../../../shared/engine/times.ts';
import { aRecipe, aStep, seconds } from './build.ts';

const timesOf = (steps: Parameters<typeof aStep>[0][]) => computeTimes(aRecipe([], { steps: steps.map(aStep) }));

describe('times', () => {
  it('adds up steps that follow each other, least and most', () => {
    const times = timesOf([
      { id: 'chop', duration: seconds(300, 600) },
      { id: 'steep', duration: seconds(86_400, 172_800), attention: 'waiting' },
      { id: 'strain', duration: seconds(120) },
    ]);
    expect(times.handsOn).toMatchObject({ known: true, min: 420, max: 720 });
    expect(times.waiting).toMatchObject({ known: true, min: 86_400, max: 172_800 });
    expect(times.total).toMatchObject({ known: true, min: 86_820, max: 173_520, how: 'computed' });
  });

  // Critical path: two branches that start together and meet.
  it('takes the longer of two branches', () => {
    const times = timesOf([
      { id: 'freeze', duration: seconds(3600), attention: 'waiting', after: [] },
      { id: 'steep', duration: seconds(7200), attention: 'waiting', after: [] },
      { id: 'join', duration: seconds(60), after: ['freeze', 'steep'] },
    ]);
    expect(times.total).toMatchObject({ min: 7260, max: 7260 });
    expect(times.waiting).toMatchObject({ min: 7200, max: 7200 });
  });

  it('does not let one pair of hands do two things at once', () => {
    const times = timesOf([
      { id: 'a', duration: seconds(600), after: [] },
      { id: 'b', duration: seconds(600), after: [] },
    ]);
    expect(times.total).toMatchObject({ min: 1200, max: 1200 });
  });

  it('says which step has no time, and keeps what is known', () => {
    const times = timesOf([
      { id: 'stir', text: 'Stir until clear.' },
      { id: 'rest', duration: seconds(3600), attention: 'waiting' },
    ]);
    expect(times.handsOn).toEqual({
      known: false,
      lacks: [{ code: 'duration-missing', subject: 'Stir until clear.' }],
    });
    expect(times.total.known).toBe(false);
    expect(times.waiting).toMatchObject({ known: true, min: 3600 });
  });

  it('reports steps that wait for each other, and none of the three times', () => {
    const steps = [
      aStep({ id: 'a', after: ['c'], duration: seconds(1) }),
      aStep({ id: 'b', after: ['a'], duration: seconds(1) }),
      aStep({ id: 'c', after: ['b'], duration: seconds(1) }),
    ];
    expect(new Set(findStepCycle(steps))).toEqual(new Set(['a', 'b', 'c']));
    const times = computeTimes(aRecipe([], { steps }));
    expect(times.total).toMatchObject({ known: false });
    expect(times.handsOn.known === false && times.handsOn.lacks.map((lack) => lack.code)).toEqual(
      Array(3).fill('step-cycle'),
    );
    expect(findStepCycle([aStep({ id: 'a' }), aStep({ id: 'b' })])).toBeNull();
  });

  it('knows nothing of a recipe without steps', () => {
    expect(timesOf([]).total.known).toBe(false);
  });
});
