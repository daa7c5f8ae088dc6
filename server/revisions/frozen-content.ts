import { designDocument, type DesignDocument } from '../../shared/model/design-document';
import { contentFrom, type DesignContent, type EditionReference } from '../projects/design-content-service';

/** A stored part; bodies are canonical JSON. */
interface Part {
  readonly role: string;
  readonly body: Buffer;
}

/** The content of a revision from its parts. @throws when it does not have the hash that the revision was given */
export function frozenContent(parts: readonly Part[], expectedHash: string): DesignContent {
  const read = (role: string): unknown => {
    const part = parts.find((candidate) => candidate.role === role);
    return part === undefined ? null : JSON.parse(part.body.toString('utf8'));
  };
  const design = read('design');
  // Checked but not taken from the schema: what a later schema fills in would not be what was frozen.
  designDocument.parse(design);
  const content = contentFrom(design as DesignDocument, read('edition') as EditionReference | null);
  if (content.hash !== expectedHash) throw new Error(`the content of a revision has the hash ${content.hash}, not ${expectedHash}`);
  return content;
}
