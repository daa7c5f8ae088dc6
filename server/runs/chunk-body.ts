import { deflateRawSync, inflateRawSync } from 'node:zlib';

/** A part as it is stored: JSON, which gives every double back as it was, deflated. */
export const packPart = (part: unknown): Buffer => deflateRawSync(Buffer.from(JSON.stringify(part), 'utf8'), { level: 1 });

export const unpackPart = (body: Buffer): unknown => JSON.parse(inflateRawSync(body).toString('utf8'));
