import 'server-only';
import { problemOf } from './problem';

/** A line that says nothing, so that no proxy takes a long silence for the end. */
const BEAT_MS = 15_000;

export interface Settled {
  status: number;
  answer: unknown;
}

/**
 * Answers long work by events while it goes on: `progress` for every report, then one `done` with the status and body
 * that a plain answer would have had, or one `failed` with its problem. The stream's end without either means that the
 * line broke; the request may be sent again under its key.
 *
 * @param work is given a function that reports. The person who leaves ends the work through the request's own signal.
 */
export function eventAnswer(work: (report: (progress: unknown) => void) => Promise<Settled>): Response {
  const encoder = new TextEncoder();
  let beat: NodeJS.Timeout | undefined;
  let isOpen = true;
  const close = () => {
    isOpen = false;
    clearInterval(beat);
  };
  const stream = new ReadableStream<Uint8Array>({
    async start(controller) {
      const write = (text: string) => isOpen && controller.enqueue(encoder.encode(text));
      const event = (name: string, data: unknown) => write(`event: ${name}\ndata: ${JSON.stringify(data)}\n\n`);
      beat = setInterval(() => write(': still at work\n\n'), BEAT_MS);
      try {
        const { status, answer } = await work((progress) => event('progress', progress));
        event('done', { status, body: answer });
      } catch (error) {
        event('failed', problemOf(error));
      }
      if (isOpen) controller.close();
      close();
    },
    cancel: close,
  });
  return new Response(stream, {
    headers: {
      'content-type': 'text/event-stream; charset=utf-8',
      'cache-control': 'private, no-store, no-transform',
      'x-accel-buffering': 'no',
    },
  });
}

/** Whether the client asks for events rather than one answer. */
export const wantsEvents = (headers: Headers): boolean => headers.get('accept')?.includes('text/event-stream') ?? false;
