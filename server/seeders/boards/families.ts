import type { LayoutDocumentInput } from '@/shared';

type FamilyInput = NonNullable<LayoutDocumentInput['families']>[number];

/** 4K x 1 static in 18 pins; only the pins that a bench measures first are listed. */
export const static4kBy1 = {
  id: 'static-4k-1',
  name: '4K x 1 static, 18 pins',
  kind: 'static',
  words: 4096,
  width: 1,
  pins: [
    { pin: 7, name: 'Q', does: 'data-out', index: 0 },
    { pin: 8, name: '/WE', does: 'write-enable' },
    { pin: 9, name: '0 V', does: 'ground' },
    { pin: 10, name: '/CS', does: 'chip-select' },
    { pin: 11, name: 'D', does: 'data-in', index: 0 },
    { pin: 18, name: '+5 V', does: 'supply', volts: 5, tolerancePercent: 10 },
  ],
  stackable: true,
  source: 'Common practice for this package; check the data sheet of the chip that you fit.',
} satisfies FamilyInput;
