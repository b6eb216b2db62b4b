import fc from 'fast-check';

/** One seed for all, so that a failure comes again; the report of a failure prints it with the smallest input. */
export const seed = 20270302;

/** Fails with every difference, the input and the seed unless `compare` finds nothing over `numRuns` inputs. */
export async function agree<T>(
  inputs: fc.Arbitrary<T>,
  compare: (given: T) => Promise<string[]>,
  numRuns = 150,
): Promise<void> {
  await fc.assert(
    fc.asyncProperty(inputs, async (given) => {
      const found = await compare(given);
      if (found.length > 0) throw new Error(`${found.join('\n')}\ninput: ${JSON.stringify(given)}`);
    }),
    { seed, numRuns },
  );
}
