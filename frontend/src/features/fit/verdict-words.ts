// The answer in sentences: what each side sees, and what hides it.
import type { ClearanceAnswer, SideAnswer } from '@tiltwright/shared/schemas/answer.ts';
import type { FitAnswer, Verdict } from '@tiltwright/shared/schemas/fit.ts';
import { formatShare } from '../../lib/format-units.ts';
import { hiderWords } from './fit-scene.ts';
import type { FitState } from './fit-state.ts';

const words: Record<Verdict, string> = {
  fits: 'Fits',
  'fits-with-care': 'Fits with care',
  'does-not-fit': 'Does not fit',
  'cannot-tell': 'Cannot be told yet',
};
export function verdictWords(verdict: Verdict): string {
  return words[verdict];
}

export type SideName = 'port' | 'starboard';

/** The sides that are wanted and have an answer. */
export function wantedSides({ wanted }: Pick<FitState, 'wanted'>, clearance: ClearanceAnswer): [SideName, SideAnswer][] {
  return (['port', 'starboard'] as const).flatMap((name) => {
    const side = clearance[name];
    return side && (wanted === 'both' || wanted === name) ? [[name, side] as [SideName, SideAnswer]] : [];
  });
}

/** One sentence for the head of the answer. */
export function headline(state: FitState, { verdict, clearance }: Pick<FitAnswer, 'verdict' | 'clearance'>): string {
  if (verdict === 'cannot-tell') return 'This placing cannot be judged yet.';
  const sides = wantedSides(state, clearance);
  if (sides.length === 0) return 'There is no side-looking picture to judge.';
  const dark = sides.filter(([, side]) => side.verdict !== 'clear');
  if (dark.length === 0) return sides.length === 2 ? 'Both sides look out freely.' : `The ${sides[0]?.[0]} side looks out freely.`;
  if (dark.length === 2) return `Both sides are in part hidden: ${dark.map(([name, side]) => `${name} ${lossWords(side)}`).join(', ')}.`;
  const [name, side] = dark[0] as [SideName, SideAnswer];
  const by = greatestHider(side, state);
  return `The ${name} side is ${howHidden(side)}${by ? ` by the ${by}` : ''}.`;
}

function howHidden({ clearShare, sectors }: SideAnswer): string {
  if (clearShare < 0.02) return 'wholly hidden';
  if (clearShare < 0.5) return 'mostly hidden';
  if (clearShare < 0.85) return 'partly hidden';
  return sectors.every(({ kind }) => kind === 'thinned') ? 'slightly thinned' : 'slightly hidden';
}

function lossWords({ clearShare }: SideAnswer): string {
  return `${formatShare(1 - clearShare)} lost`;
}

/** The part that hides most of a side's picture, or thins it where nothing is hidden, with its motor's name where there are two. */
export function greatestHider({ sectors }: SideAnswer, state: Pick<FitState, 'motors'>): string | null {
  const shares = new Map<string, number>();
  const hidden = sectors.filter(({ kind }) => kind === 'hidden');
  for (const { by, share } of hidden.length > 0 ? hidden : sectors) {
    const name = hiderWords(by, state);
    shares.set(name, (shares.get(name) ?? 0) + share);
  }
  const [greatest] = [...shares].sort((a, b) => b[1] - a[1]);
  return greatest?.[0] ?? null;
}

/** "clear", "shaded", "blocked" as an owner would say it. */
export function sideWords({ verdict, clearShare }: SideAnswer): string {
  if (verdict === 'clear' && clearShare === 1) return 'all clear';
  return `${formatShare(clearShare)} clear`;
}

/** "port 59 % clear, starboard all clear" */
export function sidesInShort(state: Pick<FitState, 'wanted'>, clearance: ClearanceAnswer): string {
  return wantedSides(state, clearance)
    .map(([name, side]) => `${name} ${sideWords(side)}`)
    .join(', ');
}
