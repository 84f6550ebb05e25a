import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { EstimateAnswer } from '../../shared/contracts/samples';
import type { Problem } from '../../shared/contracts/problems';
import { rows } from '../support/referencePoints';
import { startTestApp, type TestApp } from '../support/testApp';

interface FitsBody {
  fits: { group: string | null; n: number; exponent: { estimate: number; standardError: number | null } | null; predictions: unknown[] | null; tests: { exponent: number; p: number }[]; points: { id: string; flags: string[] }[]; unfit: { code: string } | null; notes: string[] }[];
}

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ env: { CALCULATOR_CALLS_PER_MINUTE: '300' } });
});
afterAll(() => app.close());

const fit = (body: unknown) => app.anonymous.post<FitsBody>('/fits', body);

describe('POST /samples/estimate', () => {
  const body = {
    tissueMassG: 0.8, suspensionVolumeMl: 12, dilution: 2, scaleUp: { kind: 'other-side' },
    aliquots: [100, 110, 90, 100].map((nuclei) => ({ nuclei, volumeMl: 0.0004 })), neun: { positive: 250, total: 500 },
  };

  it('doubles mass and counts of one side and leaves the density as counted', async () => {
    const { status, body: answer } = await app.anonymous.post<EstimateAnswer>('/samples/estimate', body);
    // 400 nuclei in 4 × 0.0004 mL, diluted to twice the volume: 500 000 per mL of suspension, 6 million in 12 mL, 12 million on both sides.
    expect(status).toBe(200);
    expect(answer.cells.value).toBeCloseTo(12_000_000, 3);
    expect(answer.neurons.value).toBeCloseTo(6_000_000, 3);
    expect(answer.structureMassG).toBeCloseTo(1.6, 12);
    expect(answer.cellsPerMg.value).toBeCloseTo(7_500, 6);
    expect(answer.checks.length).toBeGreaterThan(0);
  });

  it('names every impossible field by its path', async () => {
    const { status, body: problem } = await app.anonymous.post<Problem>('/samples/estimate', { ...body, tissueMassG: -1, dilution: 0.5, aliquots: [{ nuclei: 1.5, volumeMl: 0 }] });
    expect(status).toBe(400);
    expect(problem.errors.map(({ path }) => path)).toEqual(['tissueMassG', 'dilution', 'aliquots.0.nuclei', 'aliquots.0.volumeMl']);
  });
});

describe('POST /fits', () => {
  it('fits each group by itself, in the order in which they come', async () => {
    const points = [['b', 1, 2], ['b', 10, 20], ['b', 100, 205], ['a', 1, 1], ['a', 10, 31], ['a', 100, 1000]].map(([group, x, y], index) => ({ id: `s${index}`, group, x, y }));
    const { body } = await fit({ points, against: [1] });
    expect(body.fits.map(({ group }) => group)).toEqual(['b', 'a']);
    expect(body.fits[0]?.exponent?.estimate).toBeCloseTo((Math.log10(205) - Math.log10(2)) / 2, 10);
    expect(body.fits[1]?.tests[0]?.p).toBeLessThan(0.05);
  });

  it('flags the three dinosaurs together', async () => {
    const { body } = await fit({ points: rows.animals });
    const outliers = body.fits[0]?.points.filter(({ flags }) => flags.includes('outlier')).map(({ id }) => id);
    expect(outliers?.sort()).toEqual(['Brachiosaurus', 'Dipliodocus', 'Triceratops']);
  });

  it('answers what a method does not define by null, with the reason', async () => {
    const { body } = await fit({ points: rows.animals, method: 'sma' });
    expect(body.fits[0]?.predictions).toBeNull();
    expect(body.fits[0]?.exponent?.standardError).toBeNull();
    expect(body.fits[0]?.notes.join(' ')).toContain('does not predict');
  });

  it('answers points that give no line by the reason', async () => {
    const { status, body } = await fit({ points: [{ id: 'a', x: 1, y: 1 }, { id: 'b', x: 2, y: 2 }] });
    expect(status).toBe(200);
    expect(body.fits[0]).toMatchObject({ n: 2, exponent: null, unfit: { code: 'too-few-points' } });
  });

  it('refuses a method it does not know, values at or below zero and more than 5,000 points', async () => {
    expect((await fit({ points: [{ id: 'a', x: 0, y: -1 }], method: 'lasso' })).status).toBe(400);
    const many = Array.from({ length: 5001 }, (_, index) => ({ id: `s${index}`, x: index + 1, y: index + 1 }));
    const { status } = await app.anonymous.post<Problem>('/fits', { points: many });
    expect(status).toBe(400);
    expect((await fit({ points: many.slice(0, 5000) })).status).toBe(200);
  });
});

describe('the limit of the calculators', () => {
  it('answers 300 calls a minute from one address and then 429 as a problem document, before the body is read', async () => {
    const own = await startTestApp({ env: { CALCULATOR_CALLS_PER_MINUTE: '300' } });
    try {
      const statuses: number[] = [];
      for (let call = 0; call < 300; call += 1) statuses.push((await own.anonymous.post('/fits', { points: [{ id: 'a', x: 1, y: 1 }] })).status);
      expect(new Set(statuses)).toEqual(new Set([200]));
      const refused = await own.anonymous.post<Problem>('/samples/estimate', {});
      expect(refused.status).toBe(429);
      expect(refused.headers.get('content-type')).toContain('application/problem+json');
      expect(refused.body.code).toBe('too-many-requests');
      expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
      expect((await own.anonymous.get('/health')).status).not.toBe(429);
    } finally {
      await own.close();
    }
  });
});
