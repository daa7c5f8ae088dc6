import type { Response } from 'express';

/** Answers that stay open to tell of events. A server that stops ends them; their readers come back to the next one. */
export class EventStreams {
  private readonly open = new Set<Response>();

  add(response: Response): void {
    this.open.add(response);
    response.on('close', () => this.open.delete(response));
  }

  endAll(): void {
    for (const response of this.open) response.end();
  }
}

export const isEventStream = (contentType: string): boolean => contentType.startsWith('text/event-stream');
