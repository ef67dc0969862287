import { euroCoins, usCoins } from '@tiltwright/shared/engine/level.ts';
import { checkTruth } from '../support/truth-table.ts';

checkTruth('shims', 12, (row) => {
  const piece = [...usCoins, ...euroCoins].find(({ id }) => id === row.piece);
  if (!piece) throw new Error(`no piece ${row.piece}`);
  return piece.thicknessMm;
});
