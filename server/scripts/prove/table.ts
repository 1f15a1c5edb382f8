/** A table of the proof, ready for Markdown. */
export interface ProofTable {
  readonly title: string;
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
  readonly notes?: readonly string[];
}

/** What a part of the proof was asked for. */
export interface ProofOptions {
  /** How many faults of each kind. */
  readonly cases: number;
  readonly seed: number;
  /** Only this kind of fault; null for all. */
  readonly only: string | null;
}

/** The options that the starting script hands over. */
export const optionsFrom = (env: NodeJS.ProcessEnv): ProofOptions => ({
  cases: Number(env.PROVE_CASES ?? 1000),
  seed: Number(env.PROVE_SEED ?? 1),
  only: env.PROVE_ONLY === undefined || env.PROVE_ONLY === '' ? null : env.PROVE_ONLY,
});

/** Hands the tables of a part to the process that prints them; without one, prints them as JSON. */
export const hand = (tables: readonly ProofTable[]): void => {
  if (process.send) process.send({ tables });
  else process.stdout.write(`${JSON.stringify(tables, null, 1)}\n`);
};
