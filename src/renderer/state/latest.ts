/** Latest wins: at most one run at a time; of the requests that arrive meanwhile only the newest is run next. */

export interface Runner<Request> {
  /** Asks for a run; returns its number. */
  ask(request: Request): number;
}

export function latestWins<Request, Answer>(
  run: (request: Request) => Promise<Answer>,
  /** Called for the newest request only: answers to superseded ones are dropped. */
  show: (answer: Answer, request: Request, runId: number) => void,
): Runner<Request> {
  let newest = 0;
  let waiting: Request | undefined;
  let running = false;

  const next = async (request: Request, runId: number): Promise<void> => {
    running = true;
    const answer = await run(request);
    running = false;
    if (runId === newest) show(answer, request, runId);
    else if (waiting !== undefined) {
      const following = waiting;
      waiting = undefined;
      void next(following, newest);
    }
  };

  return {
    ask(request) {
      newest++;
      if (running) waiting = request;
      else void next(request, newest);
      return newest;
    },
  };
}
