/** Every entity, one line each. Entities must equal what the migrations make; a test compares them. */
export const entities: readonly (new () => object)[] = [
];
