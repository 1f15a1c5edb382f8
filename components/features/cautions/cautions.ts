/** Names of the cautions, so that a screen can show the one that applies. */
export type CautionId =
  'power-off' | 'high-voltage' | 'wrong-rail' | 'negative-rail' | 'coin-cell' | 'static' | 'lead-and-fumes';

/** One caution. */
export type Caution = {
  id: CautionId;
  /** What to do or not to do, in one line; enough where there is little room. */
  title: string;
  /** Why, and how, in a few sentences. */
  body: string;
};

const texts: Record<CautionId, Omit<Caution, 'id'>> = {
  'power-off': {
    title: 'Power off and wait before you move a chip.',
    body: 'Switch off, unplug, and wait until the supply has run down; measure it at the board if the service manual gives a time or a point. A chip that is pulled or fitted under power is often lost, and its neighbours with it.',
  },
  'high-voltage': {
    title: 'Mains and picture-tube voltages are not bench work for everybody.',
    body: 'Many machines hold mains parts beside the board, and a picture tube keeps a dangerous charge after it is switched off. Leave both to somebody who is trained and permitted for it where you are, under local electrical codes.',
  },
  'wrong-rail': {
    title: 'A wrong rail at a pin destroys the replacement.',
    body: 'Chips of the same size can want their supplies at other pins and of other voltages. Before a replacement goes in, check its supply pins in its data sheet against the voltages measured at the empty socket.',
  },
  'negative-rail': {
    title: 'Three-rail RAM must never run without its negative rail.',
    body: 'RAM with +12 V, +5 V and −5 V is damaged in moments if the −5 V is missing while the others are there. Measure the −5 V at the socket first, and find out why it is missing before any chip goes in.',
  },
  'coin-cell': {
    title: 'Never charge a lithium coin cell.',
    body: 'A lithium primary cell that is charged can burst. Where the board charges its cell, fit only the kind of cell that the service manual names, or change the circuit as the manual allows. Look for leaked cells, and clean what they spoiled.',
  },
  static: {
    title: 'Touch earth before you touch a chip.',
    body: 'Static that you do not feel can damage RAM so that it fails later. Wear a wrist strap at an earthed mat, keep chips in conductive foam, and hold them by their ends. Take the strap off before you work near live mains.',
  },
  'lead-and-fumes': {
    title: 'Solder holds lead, and flux fumes harm the lungs.',
    body: 'Draw the fumes away from your face, wash your hands before you eat, and keep solder waste apart. Follow the local rules for lead and for old electronic parts.',
  },
};

/** Every caution, in the order in which a repair meets them. */
export const cautions: readonly Caution[] = (Object.keys(texts) as CautionId[]).map((id) => ({ id, ...texts[id] }));

/** The caution of a name. */
export const cautionOf = (id: CautionId): Caution => ({ id, ...texts[id] });

/** What every caution defers to. */
export const cautionsDefer =
  'These cautions are short and general. The service manual of the equipment and the rules of the place where you work go before them; where they differ, follow those.';
