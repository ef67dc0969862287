// Choices: one of a few words, whatever its case, hyphens and trade spelling.
import { type CellError, type CellFilled, filled, quoted, refused } from './cell.ts';

/** Letters and figures alone: “Deep V”, “deep-v” and “DEEP_V” are one word. */
function fold(text: string): string {
  return text
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^a-z0-9/]/g, '');
}

type Spellings = Readonly<Record<string, readonly string[]>>;

const material: Spellings = {
  aluminium: ['aluminum', 'alu', 'alloy', 'marine alloy'],
  'glass-fibre': ['fiberglass', 'fibreglass', 'glassfiber', 'glassfibre', 'grp', 'frp', 'gfrp', 'glass reinforced plastic'],
  wood: ['wooden', 'timber', 'plywood', 'ply'],
  polyethylene: ['poly', 'pe', 'hdpe', 'rotomoulded', 'rotomolded', 'rotomoulded polyethylene', 'rotomolded polyethylene'],
  inflatable: ['pvc', 'inflatable boat'],
  composite: ['carbon', 'carbon fibre', 'carbon fiber'],
};

const mount: Spellings = {
  'transom-bracket': ['bracket', 'transom mount', 'transom'],
  'kick-up-bracket': ['kick-up', 'kickup bracket', 'kick up mount'],
  'transom-board': ['board', 'mounting board', 'transom plate'],
  'through-hull': ['thru-hull', 'thruhull', 'through the hull'],
  'in-hull': ['inside hull', 'shoot-through', 'shoot-thru', 'in the hull'],
  pole: ['pole mount'],
  'sensor-jack': ['transducer jack', 'jack'],
  'bow-motor': ['trolling motor', 'bow trolling motor', 'bow electric motor', 'bow mount motor'],
};

/** Trade spellings by field; common practice, no source. */
const spellingsByField: Readonly<Record<string, Spellings>> = {
  form: {
    flat: ['flat bottom', 'flat bottomed', 'jon', 'jon boat', 'john boat', 'punt'],
    'shallow-v': ['shallow vee'],
    'modified-v': ['modified vee', 'mod v', 'mod vee'],
    'deep-v': ['deep vee'],
    'tri-hull': ['trihull', 'cathedral', 'cathedral hull'],
    pontoon: ['pontoon boat', 'tritoon'],
    catamaran: ['cat', 'power cat', 'power catamaran'],
  },
  material,
  hullMaterials: material,
  drive: {
    outboard: ['ob', 'o/b', 'outboard motor'],
    sterndrive: ['stern drive', 'i/o', 'inboard outboard', 'inboard/outboard', 'outdrive', 'z drive'],
    kicker: ['kicker motor', 'auxiliary', 'aux'],
    electric: ['electric motor', 'trolling motor', 'electric outboard', 'bow motor'],
  },
  rotation: {
    right: ['rh', 'r', 'right hand', 'right handed', 'clockwise', 'cw'],
    left: ['lh', 'l', 'left hand', 'left handed', 'counterclockwise', 'anticlockwise', 'ccw', 'counter rotating', 'counter rotation'],
    dual: ['dual prop', 'dual propeller', 'twin prop', 'contra rotating'],
  },
  kinds: {
    side: ['side looking', 'sidelooking'],
    down: ['down looking', 'downlooking'],
    cone: ['conical', 'round beam'],
  },
  kind: mount,
  mountKinds: mount,
  beamLevelWay: { one: ['1', '1 way', 'one way', 'single'], two: ['2', '2 way', 'two way'] },
  method: {
    class: ['class default', 'default'],
    measured: ['measurement'],
    published: ['publication'],
    estimated: ['estimate', 'est', 'est.'],
  },
};

/** Words that several of the choices answer to. */
const ambiguousByField: Readonly<Record<string, Spellings>> = {
  form: {
    v: ['shallow-v', 'modified-v', 'deep-v'],
    vee: ['shallow-v', 'modified-v', 'deep-v'],
    vhull: ['shallow-v', 'modified-v', 'deep-v'],
    vbottom: ['shallow-v', 'modified-v', 'deep-v'],
    semiv: ['shallow-v', 'modified-v'],
    semivee: ['shallow-v', 'modified-v'],
    multihull: ['catamaran', 'tri-hull', 'pontoon'],
  },
  material: { rib: ['inflatable', 'glass-fibre', 'aluminium'], plastic: ['polyethylene', 'glass-fibre'] },
  rotation: { standard: ['right'], counter: ['left'], both: ['right', 'left', 'dual'] },
};

const withoutLowerUnit = new Set(
  [
    'jet',
    'jet drive',
    'jet outboard',
    'water jet',
    'pump jet',
    'shaft',
    'shaft drive',
    'straight shaft',
    'inboard',
    'inboard shaft',
    'v-drive',
  ].map(fold),
);

export type ChoiceReader = (tidied: string) => CellFilled<string> | CellError;

/** A reader of one choice of `values`, with the trade spellings known for `field`. */
export function choiceReader(field: string, values: readonly string[]): ChoiceReader {
  const known = new Map<string, string>();
  const spellings = spellingsByField[field] ?? {};
  for (const value of values) {
    for (const word of spellings[value] ?? []) known.set(fold(word), value);
  }
  // A choice's own name wins over any spelling of another.
  for (const value of values) known.set(fold(value), value);
  const ambiguous = new Map(Object.entries(ambiguousByField[field] ?? {}));

  return (tidied) => {
    const exact = known.get(tidied);
    if (exact === tidied) return filled(exact);
    const word = fold(tidied);
    const value = known.get(word);
    if (value !== undefined) return filled(value);
    if (field === 'drive' && withoutLowerUnit.has(word)) {
      return refused('refused-drive', `${quoted(tidied)}: nothing to clear: jet and shaft drives have no lower unit here.`);
    }
    const several = ambiguous.get(word);
    if (several) return refused('ambiguous-choice', `${quoted(tidied)} could mean ${several.join(', ')}.`, several);
    const alike = values.filter((v) => word.length >= 3 && (fold(v).startsWith(word.slice(0, 3)) || fold(v).includes(word)));
    return refused('unknown-choice', `${quoted(tidied)} is none of ${values.join(', ')}.`, alike);
  };
}
