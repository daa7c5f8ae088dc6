/** Which room a file belongs to, and which rooms it may open. The architecture test plants violations of each line. */
export const wallElements = [];
export const wallRules = {};
