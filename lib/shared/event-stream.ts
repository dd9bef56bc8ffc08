/** One event of a server's stream: its name, and its data as parsed JSON. */
export interface StreamEvent {
  name: string;
  data: unknown;
}

/**
 * The events of a text/event-stream body, as they come. Lines that only keep the connection alive are passed over.
 *
 * @throws what reading the body throws: the line broke, or the reader gave up.
 */
export async function* eventsOf(body: ReadableStream<Uint8Array>): AsyncGenerator<StreamEvent> {
  const reader = body.getReader();
  const decoder = new TextDecoder();
  let waiting = '';
  try {
    for (;;) {
      const { value, done } = await reader.read();
      if (done) return;
      const parts = (waiting + decoder.decode(value, { stream: true })).split('\n\n');
      waiting = parts.pop() ?? '';
      for (const part of parts) {
        const event = eventOf(part);
        if (event) yield event;
      }
    }
  } finally {
    await reader.cancel().catch(() => undefined);
  }
}

function eventOf(part: string): StreamEvent | null {
  let name = 'message';
  let data = '';
  for (const line of part.split('\n')) {
    if (line.startsWith('event: ')) name = line.slice(7);
    else if (line.startsWith('data: ')) data += line.slice(6);
  }
  return data === '' ? null : { name, data: JSON.parse(data) };
}
