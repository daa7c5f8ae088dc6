import { predictionReply, predictionRequest, type CutRequest, type PredictionRequest } from '../../shared/contracts/predictions';
import { InvalidInput, NotAcceptable } from '../http/problems';
import { BytesReply, MAX_JSON_NUMBERS } from '../http/reply';
import { defineRoute, type Route } from '../http/route';
import { COMPUTE_SECONDS } from '../http/time-limit';
import { predictionBlockOf, predictionReplyOf } from './prediction-reply';
import type { PredictionService, PredictionWish } from './prediction-service';
import { MAX_CUT_SAMPLES, arrayNumberBound, cutSamples } from './prediction-size';

const BLOCK = 'application/octet-stream';
const DEFAULT_UV_SIZE = 256;
const DEFAULT_CUTS: readonly CutRequest[] = [
  { plane: 'along', angleDeg: [-90, 90, 0.1] },
  { plane: 'across', angleDeg: [-90, 90, 0.1] },
];

function wishOf({ design, include = [], cuts, frequencyGHz, harmonic, uvSize }: PredictionRequest): PredictionWish {
  return {
    design,
    frequencyGHz,
    harmonic,
    cells: include.includes('cells'),
    cuts: include.includes('cuts') ? (cuts ?? DEFAULT_CUTS) : undefined,
    uvSize: include.includes('uv') ? (uvSize ?? DEFAULT_UV_SIZE) : undefined,
  };
}

function refuseOversized(wish: PredictionWish, asBlock: boolean): void {
  const samples = cutSamples(wish.cuts ?? []);
  if (samples > MAX_CUT_SAMPLES) throw new InvalidInput([{ pointer: '#/cuts', detail: `would have ${samples} samples; the limit is ${MAX_CUT_SAMPLES}` }]);
  const numbers = arrayNumberBound(wish);
  if (!asBlock && numbers > MAX_JSON_NUMBERS) {
    throw new NotAcceptable(`Up to ${numbers} numbers are too many for JSON, the limit is ${MAX_JSON_NUMBERS}: ask with Accept: ${BLOCK}.`);
  }
}

/** Names a preview of one client: of a session, or of everything that a token's owner runs. */
function previewOf(name: string | undefined, caller: { sessionId: string | null; person: { id: string } }): string | undefined {
  if (name === undefined) return undefined;
  if (!/^[\x21-\x7e]{1,80}$/.test(name)) throw new InvalidInput([{ pointer: 'Slantwise-Preview', detail: 'must have 1 to 80 visible ASCII characters' }]);
  return `${caller.sessionId ?? caller.person.id} ${name}`;
}

export const predictionRoutes = ({ predictions }: { predictions: PredictionService }): readonly Route[] => [
  defineRoute({
    method: 'post',
    path: '/api/predictions',
    summary: 'Predict a design without storing anything; as JSON, or as a binary block with Accept: application/octet-stream',
    policy: { kind: 'signed-in', scope: 'predict' },
    rate: 'compute',
    timeLimitSeconds: COMPUTE_SECONDS,
    body: predictionRequest,
    reply: predictionReply,
    bytes: [BLOCK],
    handler: async ({ caller, body, wants, header, signal }) => {
      const wish = wishOf(body);
      const asBlock = wants(BLOCK);
      refuseOversized(wish, asBlock);
      const prediction = await predictions.predict(caller.teamId, { ...wish, preview: previewOf(header('slantwise-preview'), caller), signal });
      return asBlock ? new BytesReply(predictionBlockOf(prediction), BLOCK) : predictionReplyOf(prediction);
    },
  }),
];
