/**
 * Runs work on what a source gives, at most `atOnce` pieces at a time, and yields the results in the source's order as
 * soon as each is there. A slow reader holds up the source; a source that waits holds up no result.
 */
export async function* inOrder<In, Out>(source: AsyncIterable<In>, work: (piece: In) => Promise<Out>, atOnce: number): AsyncGenerator<Out> {
  const results: Promise<Out>[] = [];
  let ended = false;
  let failure: unknown;
  let wakeReader = () => {};
  let wakeSource = () => {};

  const reading = (async () => {
    try {
      for await (const piece of source) {
        const result = work(piece);
        // Whoever awaits it later sees the failure; until then it must not count as unhandled.
        result.catch(() => {});
        results.push(result);
        wakeReader();
        while (results.length >= atOnce && !ended) await new Promise<void>((resolve) => (wakeSource = resolve));
        if (ended) return;
      }
    } catch (error) {
      failure = error;
    }
    ended = true;
    wakeReader();
  })();

  try {
    for (;;) {
      while (results.length === 0 && !ended) await new Promise<void>((resolve) => (wakeReader = resolve));
      const result = results[0];
      if (!result) break;
      yield await result;
      void results.shift();
      wakeSource();
    }
    await reading;
    if (failure !== undefined) throw failure;
  } finally {
    ended = true;
    wakeSource();
  }
}
