import { letter, type Recipient } from './messages';
import type { Config } from '@/server/config';
import type { Mail } from '@/server/services/outbox';

/** Which version of which board a mail is about. */
interface Subject {
  readonly board: string;
  readonly slug: string;
  readonly number: number;
  /** Words of the moderator. */
  readonly remarks: string | null;
}

type Decision = 'published' | 'returned' | 'rejected' | 'retired';

/** Tells the author of a version what a moderator decided, with his words. */
export const decisionMail = (config: Config, to: Recipient, about: Subject & { decision: Decision }): Mail => {
  const { board, number, decision } = about;
  return letter(to, subjects[decision](board), [
    ...openings[decision](`version ${number} of ${board}`),
    ...(about.remarks === null ? [] : ['The moderator writes:', about.remarks]),
    ...(decision === 'published' ? [`${config.publicUrl}/boards/${about.slug}`] : []),
    ...(decision === 'returned' ? [`${config.publicUrl}/contribute`] : []),
  ]);
};

const subjects: Record<Decision, (board: string) => string> = {
  published: (board) => `Published: ${board}`,
  returned: (board) => `Please look again: ${board}`,
  rejected: (board) => `Not published: ${board}`,
  retired: (board) => `Withdrawn: ${board}`,
};

const openings: Record<Decision, (version: string) => string[]> = {
  published: (version) => [`${version} is published. Every technician finds it from now on. Thank you.`],
  returned: (version) => [`a moderator has looked at ${version} and asks you to change it and send it again.`],
  rejected: (version) => [`a moderator has decided not to publish ${version}.`],
  retired: (version) => [`a moderator has withdrawn ${version}. It is no longer in the look-up.`],
};
