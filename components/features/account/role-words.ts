import type { Role } from '@/shared/standing';

/** What each role may do, in one sentence. */
export const roleWords: Record<Role, string> = {
  technician: 'Looks failures up, and keeps an own account.',
  contributor: 'Documents boards that others then rely on; a moderator looks at each before it is published.',
  moderator: 'Looks at what contributors send, publishes it or returns it, and gives roles.',
  owner: 'Runs this Rowcall, and makes moderators.',
};
