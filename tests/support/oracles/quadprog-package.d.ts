declare module 'quadprog' {
  /** min 1/2 b'Db - d'b with A'b >= b0, the first `equalities` of them equal; every array starts at index 1. */
  export function solveQP(
    D: number[][],
    d: number[],
    A: number[][],
    b0: number[],
    equalities?: number,
  ): { solution: number[]; value: number[]; iterations: number[]; message: string };
}
