import type { Response } from 'express';
import type { EventSource } from './route';

/** Proxies drop a stream that is silent for a minute. */
const KEEP_ALIVE = 25_000;
/** Bytes that may wait for a reader that does not read. */
const MOST_BUFFERED = 65_536;

/** Answers with server-sent events until either side ends it. */
export function sendEvents(response: Response, source: EventSource): void {
  response.set({ 'Content-Type': 'text/event-stream', 'X-Accel-Buffering': 'no' });
  response.flushHeaders();
  const write = (text: string) => {
    if (response.writableLength > MOST_BUFFERED) response.destroy();
    else response.write(text);
  };
  const stop = source({
    send: (event) => write(`event: ${event.kind}\ndata: ${JSON.stringify(event)}\n\n`),
    end: () => response.end(),
  });
  const timer = setInterval(() => write(':\n\n'), KEEP_ALIVE);
  response.on('close', () => {
    clearInterval(timer);
    stop();
  });
}
