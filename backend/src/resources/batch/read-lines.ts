// Bytes of a request to lines, with a bound on each: a line without an end must not fill the memory.

export interface InputLine {
  /** From 1. */
  n: number;
  /** Null for a line longer than allowed. */
  text: string | null;
}

const newline = 0x0a;

/** The lines of each piece of the stream together, so that nobody waits for the next piece; blank lines are skipped. */
export async function* readLines(stream: AsyncIterable<Buffer>, longestBytes: (n: number) => number): AsyncGenerator<InputLine[]> {
  let rest: Buffer[] = [];
  let restBytes = 0;
  let tooLong = false;
  let n = 1;
  const end = (): InputLine | null => {
    const text = tooLong ? null : Buffer.concat(rest).toString('utf8').trim();
    const line = text === '' ? null : { n, text };
    rest = [];
    restBytes = 0;
    tooLong = false;
    n += 1;
    return line;
  };
  const take = (piece: Buffer) => {
    restBytes += piece.length;
    if (tooLong || restBytes > longestBytes(n)) {
      tooLong = true;
      rest = [];
    } else rest.push(piece);
  };
  for await (const chunk of stream) {
    const lines: InputLine[] = [];
    let from = 0;
    for (let at = chunk.indexOf(newline); at >= 0; at = chunk.indexOf(newline, from)) {
      take(chunk.subarray(from, at));
      const line = end();
      if (line) lines.push(line);
      from = at + 1;
    }
    take(chunk.subarray(from));
    if (lines.length > 0) yield lines;
  }
  const last = end();
  if (last) yield [last];
}
