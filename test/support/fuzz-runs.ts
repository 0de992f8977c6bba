import process from 'node:process';

/** How many inputs a fuzz test tries: 2 000, or as many as the long run asks for. */
export const numRuns = Number(process.env['FUZZ_RUNS'] ?? 2_000);
