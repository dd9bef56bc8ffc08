import fc from 'fast-check';
import { expect, it } from 'vitest';
import { eventAnswer } from '@/lib/api/event-answer';
import { NotFound } from '@/lib/errors';
import { eventsOf, type StreamEvent } from '@/lib/shared/event-stream';

async function read(body: ReadableStream<Uint8Array>): Promise<StreamEvent[]> {
  const events: StreamEvent[] = [];
  for await (const event of eventsOf(body)) events.push(event);
  return events;
}

/** The same bytes in pieces of these sizes, as a network may cut them: through a letter of several bytes too. */
function inPieces(bytes: Uint8Array, sizes: readonly number[]): ReadableStream<Uint8Array> {
  let at = 0;
  let turn = 0;
  return new ReadableStream({
    pull(controller) {
      if (at >= bytes.length) return controller.close();
      const size = sizes[turn++ % sizes.length] ?? 1;
      controller.enqueue(bytes.slice(at, at + size));
      at += size;
    },
  });
}

it('brings every report and the answer over, however the network cuts them', async () => {
  const reports = fc.array(fc.jsonValue(), { maxLength: 8 });
  const sizes = fc.array(fc.integer({ min: 1, max: 40 }), { minLength: 1, maxLength: 5 });
  await fc.assert(
    fc.asyncProperty(reports, fc.jsonValue(), sizes, async (told, answer, cuts) => {
      const response = eventAnswer(async (report) => {
        for (const each of told) report(each);
        return { status: 201, answer };
      });
      const bytes = new Uint8Array(await response.arrayBuffer());
      const plain = (value: unknown) => JSON.parse(JSON.stringify(value));
      expect(await read(inPieces(bytes, cuts))).toEqual([
        ...told.map((data) => ({ name: 'progress', data: plain(data) })),
        { name: 'done', data: { status: 201, body: plain(answer) } },
      ]);
    }),
  );
});

it('ends with the problem when the work fails', async () => {
  const response = eventAnswer(() => Promise.reject(new NotFound()));
  const events = await read(response.body!);
  expect(events).toEqual([{ name: 'failed', data: expect.objectContaining({ status: 404 }) }]);
});

it('goes on quietly when the reader has left', async () => {
  let finish = () => {};
  const response = eventAnswer(async (report) => {
    await new Promise<void>((resolve) => {
      finish = resolve;
    });
    report({ late: true });
    return { status: 200, answer: null };
  });
  await response.body!.cancel();
  finish();
  await new Promise((resolve) => setTimeout(resolve, 5));
});
