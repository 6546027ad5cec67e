import { expect, it } from 'vitest';
import type { PlateView } from '@/lib/evidence/tlc/schema';
import { ApiError } from '@/lib/http/client';
import { memoryStore } from './marking-store';
import { sendWaiting, triedAgain, type WaitingSave } from './waiting-saves';

const plate = { id: 'p' } as PlateView;
const save = (id: string, more: Partial<WaitingSave> = {}): WaitingSave => ({
  id,
  userId: 'ottilie',
  idempotencyKey: `key of ${id}`,
  at: id,
  runCode: 'D-2026-0001',
  photo: { id: 'e', fileName: 'plate.jpg' },
  plate: null,
  body: {} as WaitingSave['body'],
  state: 'waiting',
  words: null,
  errors: [],
  tries: 0,
  conflicts: 0,
  ...more,
});
async function storeWith(...saves: WaitingSave[]) {
  const store = memoryStore();
  for (const one of saves) await store.put(one);
  return store;
}

it('sends what waits in order, by its own key, and forgets it', async () => {
  const store = await storeWith(save('1'), save('2'));
  const keys: string[] = [];
  const outcomes = await sendWaiting(store, 'ottilie', async (one) => {
    keys.push(one.idempotencyKey);
    return plate;
  });
  expect(keys).toEqual(['key of 1', 'key of 2']);
  expect(outcomes.map((one) => one.state)).toEqual(['sent', 'sent']);
  expect(await store.list('ottilie')).toEqual([]);
});

it('goes on waiting without network, keeps the key, and leaves the later ones alone', async () => {
  const store = await storeWith(save('1'), save('2'));
  let tries = 0;
  await sendWaiting(store, 'ottilie', async () => {
    tries += 1;
    throw new ApiError(0, 'no network');
  });
  expect(tries).toBe(1);
  expect(await store.list('ottilie')).toMatchObject([
    { state: 'waiting', tries: 1, idempotencyKey: 'key of 1', words: 'The server cannot be reached.' },
    { state: 'waiting', words: null },
  ]);
});

it('is refused for good with the words of the server, and is not tried again by itself', async () => {
  const store = await storeWith(save('1'), save('2'));
  const refuse = async (one: WaitingSave) => {
    if (one.id === '1')
      throw new ApiError(422, 'The lane lies off the plate.', [{ path: 'x', message: 'm' }]);
    return plate;
  };
  expect((await sendWaiting(store, 'ottilie', refuse)).map((one) => one.state)).toEqual(['refused', 'sent']);
  expect(await sendWaiting(store, 'ottilie', refuse)).toEqual([]);
  expect(await store.list('ottilie')).toMatchObject([
    { state: 'refused', words: 'The lane lies off the plate.' },
  ]);
});

it('asks again while an earlier try may still be at work, but not for ever', async () => {
  const store = await storeWith(save('1', { tries: 1 }));
  const busy = async () => {
    throw new ApiError(409, 'The same request is still being worked on.');
  };
  const states: string[] = [];
  for (let round = 0; round < 3; round += 1)
    states.push(...(await sendWaiting(store, 'ottilie', busy)).map((one) => one.state));
  expect(states).toEqual(['waiting', 'waiting', 'refused']);
  // A plate that somebody else has changed meanwhile is said at once.
  const fresh = await storeWith(save('1'));
  expect((await sendWaiting(fresh, 'ottilie', busy)).map((one) => one.state)).toEqual(['refused']);
});

it("never sends another person's marks", async () => {
  const store = await storeWith(save('1', { userId: 'joris' }));
  expect(await sendWaiting(store, 'ottilie', async () => plate)).toEqual([]);
  expect(await store.list('joris')).toHaveLength(1);
});

it('takes a new key when a person tries a refused save again', () => {
  const again = triedAgain(save('1', { state: 'refused', words: 'no', conflicts: 3 }), 'another key');
  expect(again).toMatchObject({ state: 'waiting', idempotencyKey: 'another key', words: null, conflicts: 0 });
});
