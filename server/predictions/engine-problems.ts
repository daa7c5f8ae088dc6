import { InvalidDesign } from '../../shared/antenna/invalid-design';
import { EngineRefusal } from '../engine/engine-refusals';
import { InvalidInput, Superseded, TooMany, Unavailable } from '../http/problems';

const BUSY_RETRY_SECONDS = 2;

/** What a caller is told of an error of the engine; any other error comes back as it is. */
export function problemOfEngine(error: unknown): unknown {
  if (error instanceof InvalidDesign) {
    return new InvalidInput(error.faults.map(({ pointer, detail }) => ({ pointer: pointer.replace(/^#/, '#/design'), detail })));
  }
  if (!(error instanceof EngineRefusal)) return error;
  switch (error.kind) {
    case 'superseded':
      return new Superseded(error.message);
    case 'busy':
      return new TooMany(BUSY_RETRY_SECONDS, error.message);
    case 'too-costly':
      return new InvalidInput([{ pointer: '#/design', detail: error.message }]);
    case 'abandoned':
    case 'timed-out':
      return new Unavailable(error.message);
  }
}
