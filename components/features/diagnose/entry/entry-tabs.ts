import type { Bench } from '../bench';

/** The kinds of evidence that have a tab of their own beside the report formats of the board. */
export const bitsTab = '~bits';
export const passTab = '~pass';
export const readingsTab = '~readings';
export const logTab = '~log';
export const pictureTab = '~picture';
export const signTab = '~sign';
export const supplyTab = '~supply';
export const aliasTab = '~alias';
/** One thing that can be understood in several ways, while it is changed. */
export const eitherTab = '~either';
/** The list of the kinds that are not in the strip. */
export const otherTab = '~other';

/** A kind of evidence as it is offered. */
interface KindOffer {
  readonly tab: string;
  readonly label: string;
  readonly help: string;
}

const hasAddresses = ({ document }: Bench) => document.addressMap.windows.length > 0;

/** The kinds that are rarer than a code, with what each is for; only those that this board can use. */
export function otherKinds(bench: Bench): KindOffer[] {
  const all: (KindOffer & { offered: boolean })[] = [
    {
      tab: logTab,
      label: 'A log',
      help: 'The file of a memory test, or many lines of it, up to 1 GB. It stays on this device.',
      offered: hasAddresses(bench) || bench.formats.length > 0,
    },
    {
      tab: pictureTab,
      label: 'The picture',
      help: 'Columns, dots or bands that are wrong, marked on a sketch of the screen.',
      offered: bench.document.screenMap !== undefined,
    },
    {
      tab: signTab,
      label: 'A sign',
      help: 'It changes with each pass, a chip is hot, it comes with warmth or touch, it is dead.',
      offered: true,
    },
    { tab: supplyTab, label: 'The supply', help: 'Volts measured at the pins of a socket.', offered: true },
    {
      tab: aliasTab,
      label: 'Two addresses, one cell',
      help: 'Writing at one address changes what is read at another.',
      offered: hasAddresses(bench),
    },
  ];
  return all.flatMap(({ offered, ...kind }) => (offered ? [kind] : []));
}

/** The tabs that stand in the strip, in order. */
export function stripTabs(bench: Bench): { value: string; label: string }[] {
  return [
    ...bench.formats.map(({ definition }) => ({ value: definition.id, label: definition.name })),
    ...(hasAddresses(bench) ? [{ value: readingsTab, label: 'Readings' }] : []),
    { value: bitsTab, label: 'Failing bits' },
    { value: passTab, label: 'All passed' },
    { value: otherTab, label: 'Something else' },
  ];
}

/** Whether a tab is one of those that stand under "Something else". */
export const isOther = (bench: Bench, tab: string): boolean => !stripTabs(bench).some(({ value }) => value === tab);

const kinds: readonly string[] = [
  bitsTab,
  passTab,
  readingsTab,
  logTab,
  pictureTab,
  signTab,
  supplyTab,
  aliasTab,
  eitherTab,
  otherTab,
];

/** Whether this board has such a tab. */
export function isTab(bench: Bench, tab: string): boolean {
  if (tab === pictureTab) return bench.document.screenMap !== undefined;
  return kinds.includes(tab) || bench.formats.some(({ definition }) => definition.id === tab);
}
