/** Every property runs from the same seed; fast-check prints the shrunk input of a failure. */
export const runs = (numRuns: number): { seed: number; numRuns: number } => ({ seed: 20261201, numRuns });
