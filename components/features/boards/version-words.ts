import type { VersionRow } from '@/shared/api/layouts';

const words: Record<VersionRow['state'], string> = {
  draft: 'draft',
  submitted: 'waits for a moderator',
  returned: 'returned with words',
  published: 'published before',
  rejected: 'rejected',
  retired: 'withdrawn',
};

/** How far a version has come, in words; "in use" for the one that the look-up shows. */
export function stateWords({ state, current }: Pick<VersionRow, 'state' | 'current'>): string {
  return state === 'published' && current ? 'in use' : words[state];
}
