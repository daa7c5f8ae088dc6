import { createHash } from 'node:crypto';
import type { DesignDocument } from '../../shared/model/design-document';

/** JSON with sorted keys, written apart from the product's own. Numbers and strings of the designs in tests need no more. */
function sortedJson(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    typeof inner === 'object' && inner !== null && !Array.isArray(inner) ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1))) : inner,
  );
}

/** SHA-256 over the canonical JSON of what a revision of this design freezes. */
export function designContentHash(design: DesignDocument, edition: object | null = null): string {
  return createHash('sha256').update(sortedJson({ design, edition })).digest('hex');
}
