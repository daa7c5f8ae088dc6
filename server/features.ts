import type { House } from './house';
import type { Route } from './http/route';

/** Every feature's routes, one line each. */
export const features: readonly ((house: House) => readonly Route[])[] = [
];
