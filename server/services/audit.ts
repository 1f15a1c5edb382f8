import type { Transaction } from 'sequelize';
import type { Context } from '@/server/context';

interface Act {
  /** What was done, such as role-changed. */
  readonly act: string;
  readonly subject: { readonly kind: string; readonly id: string };
  readonly detail?: Record<string, unknown>;
}

/** Writes an act of whoever asks into the audit trail, in the transaction of the act itself. */
export const recordAct = async ({ db, who }: Context, act: Act, transaction: Transaction): Promise<void> => {
  await db.AuditEntry.create(
    {
      actorId: who.standing === 'guest' ? null : who.userId,
      act: act.act,
      subjectKind: act.subject.kind,
      subjectId: act.subject.id,
      detail: act.detail ?? {},
    },
    { transaction },
  );
};
