import { useCallback } from 'react';
import { useAnnouncer } from '@/components/ui/announcer';

/**
 * Hands the link of the page on: by the device's own sheet where it has one, else to the clipboard.
 * `leftBehind`: what stays on this device, in words.
 */
export function useShareLink(title: string, leftBehind: readonly string[]): () => void {
  const { toast } = useAnnouncer();
  return useCallback(() => {
    const url = window.location.href;
    const copy = () =>
      navigator.clipboard.writeText(url).then(
        () => toast(copied(leftBehind)),
        () => toast({ kind: 'problem', text: 'The link cannot be copied here. Copy it from the address bar.' }),
      );
    // Only phones have a sheet that is better than the clipboard.
    const byHand = window.matchMedia?.('(pointer: coarse)').matches && typeof navigator.share === 'function';
    if (!byHand) {
      void (navigator.clipboard
        ? copy()
        : Promise.resolve(toast({ kind: 'problem', text: 'Copy the link from the address bar.' })));
      return;
    }
    if (leftBehind.length > 0) toast({ kind: 'problem', text: stays(leftBehind) });
    navigator.share({ title, url }).catch((error: unknown) => {
      if (!(error instanceof DOMException && error.name === 'AbortError')) void copy();
    });
  }, [title, toast, leftBehind]);
}

const stays = (left: readonly string[]) =>
  `Too large for a link, and only on this device: ${left.join(', ')}. All the rest is in the link.`;

const copied = (left: readonly string[]) =>
  left.length === 0
    ? { kind: 'good' as const, text: 'The link is copied. It holds the whole look-up.' }
    : { kind: 'problem' as const, text: `The link is copied. ${stays(left)}` };
