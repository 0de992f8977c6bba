/** How long an act takes, in milliseconds. */
export async function timeOf(act: () => unknown): Promise<number> {
  const start = performance.now();
  await act();
  return performance.now() - start;
}

/** How long an act takes each time it is done, in milliseconds. */
export async function timesOf(repeats: number, act: (turn: number) => unknown): Promise<number[]> {
  const times: number[] = [];
  for (let turn = 0; turn < repeats; turn += 1) times.push(await timeOf(() => act(turn)));
  return times;
}
