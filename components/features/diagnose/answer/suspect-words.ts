import type { Diagnosis, Suspect } from '@/shared';

/** What stands large for a suspect: its label on the board. */
export function suspectName({ socket, sharedPart, label, kind }: Suspect): string {
  if (kind === 'short' || kind === 'rail') return label;
  return sharedPart ?? socket ?? label;
}

/** What kind of thing it is, in words beside its label. */
export function suspectKind(suspect: Suspect): string {
  const { kind, cameFrom, channel, socket, label } = suspect;
  switch (kind) {
    case 'chip':
      if (socket === null) return '';
      if (cameFrom !== null && cameFrom !== socket) return `chip, came from ${cameFrom}`;
      return suspect.id.includes('#') ? 'chip fitted later' : 'chip';
    case 'position':
      return 'socket, solder or trace';
    case 'shared-part':
      return channel === null ? beside(label, suspect.sharedPart) : `${beside(label, suspect.sharedPart)}, ${channel}`;
    case 'short':
      return '';
    case 'rail':
      return suspect.sharedPart === null ? 'supply' : `supply, made by ${suspect.sharedPart}`;
  }
}

/** What a label says beyond the name that already stands there. */
function beside(label: string, name: string | null): string {
  const rest = name === null ? label : label.replace(name, '').replace(/^[\s,:(]+|[\s)]+$/g, '');
  return rest === '' ? 'shared part' : rest;
}

/** Suspects that the evidence speaks for: they explain some of it, were measured to be wrong, or belong to a group that does. Others are merely not cleared. */
export function leadingSuspects({ suspects, groups }: Diagnosis): Suspect[] {
  const members = new Set(groups.flatMap((group) => group.members.map(({ id }) => id)));
  return suspects.filter(({ id, kind, explains }) => explains.length > 0 || kind === 'rail' || members.has(id));
}
