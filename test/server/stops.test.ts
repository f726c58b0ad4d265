import { expect, test } from 'vitest';
import { stopsInReverse } from '../../server/stops';

test('what was started last stops first, and each once', async () => {
  const stopped: string[] = [];
  const stops = stopsInReverse();
  for (const name of ['store', 'runs', 'http']) stops.add(async () => stopped.push(name));
  await Promise.all([stops.run(), stops.run()]);
  expect(stopped).toEqual(['http', 'runs', 'store']);
});

test('a part that does not stop keeps none of the others running, and is told of', async () => {
  const stopped: string[] = [];
  const stops = stopsInReverse();
  stops.add(async () => stopped.push('store'));
  stops.add(() => Promise.reject(new Error('runs hang')));
  await expect(stops.run()).rejects.toThrow('runs hang');
  expect(stopped).toEqual(['store']);
});
