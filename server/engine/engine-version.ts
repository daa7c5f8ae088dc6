/**
 * Names the arithmetic of predictions. Raise it with every change that alters a figure: results kept under another
 * version are computed anew.
 */
export const ENGINE_VERSION = 'vector-6';
