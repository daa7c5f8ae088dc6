import './zod-jitless';
import * as z from 'zod';

/** A figure that does not exist for a case says why; it is never null or NaN. */
export const noFigure = z.object({ kind: z.string(), reason: z.string() }).catchall(z.union([z.number(), z.string()]));
export const figure = z.union([z.number(), noFigure]);
