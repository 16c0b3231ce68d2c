/** Between slices a worker hears what is asked, in milliseconds. */
const slice = 25;

const pause = () =>
  new Promise<void>((resolve) => {
    setTimeout(resolve);
  });

/** Runs steps as long as it is wanted, and gives way between slices. */
export async function inSlices<S, R>(
  steps: Generator<S, R>,
  wanted: () => boolean,
  after?: (last: S) => void,
): Promise<R | undefined> {
  while (wanted()) {
    const until = performance.now() + slice;
    let step = steps.next();
    while (!step.done && performance.now() < until) step = steps.next();
    if (step.done) return step.value;
    after?.(step.value);
    await pause();
  }
  return undefined;
}
