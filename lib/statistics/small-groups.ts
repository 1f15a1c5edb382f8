/** Things that were counted under one name. */
export interface NamedGroup {
  readonly name: string;
  readonly count: number;
}

/** Groups that may be shown, and what the rest come to. */
export interface ShownGroups<Group extends NamedGroup> {
  readonly shown: readonly Group[];
  /** How many groups are not shown by themselves, and what they count together; null where all are shown. */
  readonly rest: { readonly groups: number; readonly count: number } | null;
}

/** Fewer reports than this in one group could show who made them (common practice, no source for the number). */
export const leastGroup = 5;

/**
 * Breaks counts down only so far that no person shows: groups below the least size are given together, and where the
 * rest is still too small, so that the whole less the shown ones would tell it, the smallest shown group joins it.
 * Null where even all together are too few. The order of the groups is kept.
 */
export function showGroups<Group extends NamedGroup>(
  groups: readonly Group[],
  least = leastGroup,
): ShownGroups<Group> | null {
  const filled = groups.filter(({ count }) => count > 0);
  const sum = (some: readonly Group[]) => some.reduce((total, { count }) => total + count, 0);
  if (sum(filled) < least) return null;
  const shown = new Set(filled.filter(({ count }) => count >= least));
  const hidden = () => filled.filter((group) => !shown.has(group));
  while (hidden().length > 0 && shown.size > 0 && sum(hidden()) < least)
    shown.delete([...shown].reduce((small, group) => (group.count < small.count ? group : small)));
  const rest = hidden();
  return {
    shown: filled.filter((group) => shown.has(group)),
    rest: rest.length === 0 ? null : { groups: rest.length, count: sum(rest) },
  };
}
