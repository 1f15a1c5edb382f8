/** "4 Mar 2025", by the clock of this device; empty for null. */
export function dateWords(iso: string | null): string {
  return iso === null ? '' : new Date(iso).toLocaleDateString('en-GB', { dateStyle: 'medium' });
}

const steps = [
  ['day', 86_400_000],
  ['hour', 3_600_000],
  ['minute', 60_000],
] as const;

/** "2 days ago", "just now": how long before `now` (ms since 1970) something was; empty for null. */
export function agoWords(iso: string | null, now: number): string {
  if (iso === null) return '';
  const passed = now - Date.parse(iso);
  for (const [unit, size] of steps) {
    const count = Math.floor(passed / size);
    if (count >= 1) return `${count} ${unit}${count === 1 ? '' : 's'} ago`;
  }
  return 'just now';
}
