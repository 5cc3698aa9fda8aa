import { expect, onTestFinished, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { Refusal } from '#shared/api/refusal';
import { createSolving } from '../../../server/solving/solving';
import { ladder } from '../support/ladder';

function started(bounds: Parameters<typeof createSolving>[0] = {}) {
  const solving = createSolving(bounds);
  onTestFinished(() => solving.end());
  return solving;
}

/** The refusal that an answer turned out to be. */
async function refusalOf(answer: Promise<unknown>): Promise<Refusal | undefined> {
  const outcome = await answer.catch((error: unknown) => error);
  return outcome instanceof Refusal ? outcome : undefined;
}

test('a circuit solved on another thread has the record that it has on this one', async () => {
  const circuit = ladder(3);
  expect(await started().operatingPoint(circuit, 'ines')).toEqual(operatingPoint(circuit));
});

test('one that takes too long is given up, and its place goes to the next', async () => {
  // No thread begins within a millisecond.
  const solving = started({ threads: 1, timeLimit: 1 });
  const refusals = await Promise.all(['ines', 'samir'].map((asker) => refusalOf(solving.operatingPoint({}, asker))));
  expect(refusals.map((refusal) => [refusal?.code, refusal?.retryAfter])).toEqual([
    ['took-too-long', 60],
    ['took-too-long', 60],
  ]);
});

test('whoever asks for many keeps nobody else waiting', async () => {
  const solving = started({ threads: 2 });
  const order: string[] = [];
  const ask = async (asker: string, steps: number) => {
    await solving.operatingPoint(ladder(steps), asker);
    order.push(asker);
  };
  // Both threads have begun, so that how long that takes has no part in the order.
  await Promise.all(['tove', 'runa'].map((asker) => solving.operatingPoint(ladder(1), asker)));
  await Promise.all([...Array.from({ length: 4 }, () => ask('ines', 60)), ask('samir', 1)]);
  expect(order.indexOf('samir')).toBeLessThan(3);
});

test('too many are refused at once, whether one person’s or everybody’s', async () => {
  const solving = started({ threads: 1, mostWaitingOfOne: 1, mostWaiting: 2 });
  const taken = ['ines', 'ines', 'samir'].map((asker) => solving.operatingPoint(ladder(1), asker));
  expect((await refusalOf(solving.operatingPoint({}, 'tove')))?.code).toBe('busy');
  await taken[0];
  expect((await refusalOf(solving.operatingPoint({}, 'samir')))?.code).toBe('too-many');
  for (const { status } of await Promise.all(taken)) expect(status).toBe('solved');
});
