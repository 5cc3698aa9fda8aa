/** Work is put aside this often to hear what else is asked for, in ms. */
const SLICE = 4;

/** Runs work that can be put aside, and gives it up when it is no longer wanted: undefined then. */
export async function inSlices<Result>(
  work: Generator<undefined, Result>,
  isWanted: () => boolean,
): Promise<Result | undefined> {
  let since = performance.now();
  for (;;) {
    const step = work.next();
    if (step.done) return step.value;
    if (performance.now() - since < SLICE) continue;
    await otherMessages();
    if (!isWanted()) return undefined;
    since = performance.now();
  }
}

/** Comes back after the messages that wait now. A timer would be held back by the browser, a message is not. */
function otherMessages(): Promise<void> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(undefined);
  });
}
