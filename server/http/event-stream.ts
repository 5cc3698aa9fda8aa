import type { Response } from 'express';
import type { EventSource } from './route';

/** Proxies drop a stream that is silent for a minute. */
const KEEP_ALIVE = 25_000;

/** Answers with server-sent events until either side ends it. */
export function sendEvents(response: Response, source: EventSource): void {
  response.set({ 'Content-Type': 'text/event-stream', 'X-Accel-Buffering': 'no' });
  response.flushHeaders();
  const stop = source({
    send: (event) => response.write(`event: ${event.kind}\ndata: ${JSON.stringify(event)}\n\n`),
    end: () => response.end(),
  });
  const timer = setInterval(() => response.write(':\n\n'), KEEP_ALIVE);
  response.on('close', () => {
    clearInterval(timer);
    stop();
  });
}
