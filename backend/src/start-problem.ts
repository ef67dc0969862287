/** Something the person who starts the server must mend; shown as one plain sentence, exit code 1. */
export class StartProblem extends Error {
  override name = 'StartProblem';
}
