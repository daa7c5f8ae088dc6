import { pino } from 'pino';
import type { RunProgress } from '../../shared/contracts/runs';
import { RunEvents } from './run-events';

const progress = (fraction: number, state: RunProgress['state'] = 'running'): RunProgress => ({ state, stage: state, fraction, secondsLeft: null, queuePosition: null, restarts: 0 });

describe('RunEvents', () => {
  it('looks all runs of a team up with one query, tells changes alone, and ends the stream with the run', async () => {
    const asked: string[][] = [];
    const states = [progress(0.5), progress(0.5), progress(1, 'done')];
    const events = new RunEvents(
      {
        progressOf: (teamId, runIds) => {
          asked.push([teamId, ...runIds]);
          const state = states[Math.min(asked.length, states.length) - 1];
          return Promise.resolve(new Map(runIds.map((id) => [id, state])));
        },
      },
      pino({ level: 'silent' }),
    );
    const streams = ['a', 'b'].map((run) => events.watch('team', run, progress(0)));
    const [told] = await Promise.all(
      streams.map(async (stream) => {
        const pieces: string[] = [];
        for await (const piece of stream) pieces.push(String(piece));
        return pieces;
      }),
    );
    expect(told).toEqual([0, 0.5, 1].map((fraction) => `event: progress\ndata: ${JSON.stringify(progress(fraction, fraction === 1 ? 'done' : 'running'))}\n\n`));
    expect(asked).toEqual([['team', 'a', 'b'], ['team', 'a', 'b'], ['team', 'a', 'b']]);
    events.close();
  });
});
