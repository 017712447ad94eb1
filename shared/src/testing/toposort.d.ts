/** The package carries no types of its own. */
declare module 'toposort' {
  interface Toposort {
    /** The nodes in an order in which the first of each edge stands before the second. Throws on a circle. */
    array(nodes: readonly string[], edges: readonly [string, string][]): string[];
  }
  const toposort: Toposort;
  export = toposort;
}
