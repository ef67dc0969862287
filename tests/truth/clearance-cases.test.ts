// Six boats whose clear shares and hidden sectors were computed by an independent brute-force program (clearance-cases.json).
import { readFileSync } from 'node:fs';
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { InlineHull } from '@tiltwright/shared/schemas/hull.ts';
import type { InlineLowerUnit } from '@tiltwright/shared/schemas/lower-unit.ts';
import type { InlineTransducer } from '@tiltwright/shared/schemas/transducer.ts';
import { afterAll, describe, expect, it } from 'vitest';

interface Case {
  request: unknown;
  expected: {
    clearShare: { port: number; starboard: number };
    hidden: { port: [number, number][]; starboard: [number, number][] };
    tolerance: number;
  };
}

const cases: Case[] = JSON.parse(readFileSync(new URL('clearance-cases.json', import.meta.url), 'utf8'));
/** Half the fan's step on either edge, as the other program's own. */
const edgeToleranceDeg = 1;
let worstShare = 0;
let worstEdgeDeg = 0;

describe('clear share and hidden sectors against an independent program', () => {
  it('has all six boats', () => expect(cases).toHaveLength(6));

  for (const [index, { request, expected }] of cases.entries()) {
    const question = FitQuestion.parse(request);
    const answer = FitAnswer.parse(
      answerFit(
        question,
        {
          hull: question.hull as InlineHull,
          lowerUnits: question.lowerUnits.map(({ lowerUnit }) => lowerUnit as InlineLowerUnit),
          transducer: question.transducer as InlineTransducer,
        },
        { edition: 0 },
      ),
    );
    for (const side of ['port', 'starboard'] as const) {
      it(`boat ${index + 1}, ${side}`, () => {
        const seen = answer.clearance[side];
        if (!seen) throw new Error('no side answer');
        const error = Math.abs(seen.clearShare - expected.clearShare[side]);
        worstShare = Math.max(worstShare, error);
        expect(error).toBeLessThanOrEqual(expected.tolerance);
        const hidden = seen.sectors.filter(({ kind }) => kind === 'hidden').map(({ fromDeg, toDeg }) => [fromDeg, toDeg]);
        expect(hidden).toHaveLength(expected.hidden[side].length);
        hidden.flat().forEach((edge, i) => {
          const off = Math.abs(edge - (expected.hidden[side].flat()[i] as number));
          worstEdgeDeg = Math.max(worstEdgeDeg, off);
          expect(off).toBeLessThanOrEqual(edgeToleranceDeg);
        });
      });
    }
  }

  afterAll(() => {
    console.log(`clearance: worst share error ${worstShare.toFixed(5)}, worst sector edge error ${worstEdgeDeg.toFixed(4)}°`);
  });
});
