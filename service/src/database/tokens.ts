/** Injection tokens of the two connections. Only the classes of this folder ask for them. */
export const WRITER = Symbol('writer data source');
export const READER = Symbol('reader data source');
