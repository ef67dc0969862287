interface HeaderRowChoiceProps {
  /** First rows of the file as they stand. */
  top: readonly (readonly string[])[];
  value: number;
  onChange: (row: number) => void;
}

/** The first rows of the file, one of which holds the headings. */
export function HeaderRowChoice({ top, value, onChange }: HeaderRowChoiceProps) {
  // Headings stand near the top; two rows of cells below them show that they are.
  const shown = Math.max(4, value + 2);
  const rows = top.map((cells, index) => (
    // biome-ignore lint/suspicious/noArrayIndexKey: a row of a file is its number
    <Row key={index} n={index + 1} cells={cells} isChosen={value === index + 1} onChoose={onChange} />
  ));
  return (
    <fieldset className="min-w-0">
      <legend className="mb-2 w-full border-b border-ink pb-2 text-title">Which row holds the headings?</legend>
      <p className="pb-2 text-note text-ink-2">What stands above it is not read. Another row changes what the columns below are called.</p>
      {rows.slice(0, shown)}
      {rows.length > shown && (
        <details>
          <summary className="flex min-h-11 w-fit items-center text-ink-2 underline underline-offset-4">Rows below</summary>
          {rows.slice(shown)}
        </details>
      )}
    </fieldset>
  );
}

interface RowProps {
  n: number;
  cells: readonly string[];
  isChosen: boolean;
  onChoose: (n: number) => void;
}

function Row({ n, cells, isChosen, onChoose }: RowProps) {
  return (
    <label className="flex min-h-11 min-w-0 cursor-pointer items-center gap-3 border-b border-rule px-1 has-checked:bg-slate-wash hover:bg-slate-wash">
      <input type="radio" name="header-row" className="h-5 w-5 flex-none accent-ink" checked={isChosen} onChange={() => onChoose(n)} />
      <span className="w-12 flex-none text-note text-ink-2">row {n}</span>
      <span className="line-clamp-2 min-w-0 break-words">{rowWords(cells)}</span>
    </label>
  );
}

function rowWords(cells: readonly string[]): string {
  const filled = cells.filter((cell) => cell.trim() !== '');
  return filled.length === 0 ? '(empty)' : filled.join(' · ');
}
