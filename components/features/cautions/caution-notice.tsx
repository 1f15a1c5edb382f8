import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { cautionOf, type CautionId } from './cautions';
import { useDismissedCautions } from './dismissed';

type CautionNoticeProps = {
  id: CautionId;
  /** Only its one line and the way to the rest. */
  brief?: boolean;
};

/** A caution where it applies; put away for the session, and always on the page of cautions. */
export function CautionNotice({ id, brief = false }: CautionNoticeProps) {
  const { dismissed, dismiss } = useDismissedCautions();
  const caution = cautionOf(id);
  if (dismissed.has(id)) return null;
  return (
    <Notice kind="warning" title={caution.title} onDismiss={() => dismiss(id)}>
      {brief ? null : <Text variant="small">{caution.body}</Text>}
      <Link href="/learn/cautions" variant="smallStrong" standalone>
        All cautions
      </Link>
    </Notice>
  );
}
