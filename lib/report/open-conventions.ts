import type { Evidence, ReportFormat } from '@/shared';

/** A convention of a machine that a technician may not want to take for granted. */
export type Doubt = NonNullable<Extract<Evidence, { kind: 'code' }>['doubts']>[number];

/** A format with the doubted conventions left open, so that its codes are read in every way that remains. */
export function openConventions(definition: ReportFormat, doubts: readonly Doubt[]): ReportFormat {
  const parts = definition.parts.map((part) =>
    'field' in part
      ? {
          ...part,
          first: doubts.includes('first') ? ('unknown' as const) : part.first,
          bitOrder: doubts.includes('order') ? ('unknown' as const) : part.bitOrder,
        }
      : part,
  );
  return { ...definition, parts };
}
