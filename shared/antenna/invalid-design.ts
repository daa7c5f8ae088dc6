/** One fault of a design document: where (JSON pointer) and what, with its numbers. */
export interface DesignFault {
  readonly pointer: string;
  readonly detail: string;
}

/** A design whose fields are each valid but do not go together; it names every fault at once. */
export class InvalidDesign extends Error {
  override readonly name = 'InvalidDesign';

  constructor(readonly faults: readonly DesignFault[]) {
    super(faults.map((fault) => `${fault.pointer}: ${fault.detail}`).join('; '));
  }
}
