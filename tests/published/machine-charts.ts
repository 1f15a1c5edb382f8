/**
 * What published charts say of real machines: check values only, copied from the sources that each names. None of
 * these machines is part of the product's data.
 */
export interface PublishedSource {
  readonly title: string;
  readonly author: string;
  readonly year: string;
  readonly page: string;
  /** How it was read: in the source itself, or in a page that cites it. */
  readonly read: 'read' | 'secondary';
}

const startUpMemoryError: PublishedSource = {
  title: 'IBM PC 5150 start-up memory error 201, ram/5150_ram_16_64.htm and 5150_ram_64_256.htm',
  author: 'minuszerodegrees.net',
  year: 'no date',
  page: 'the two pages named',
  read: 'secondary',
};

const brenner: PublishedSource = {
  title: 'IBM PC Troubleshooting & Repair Guide (SAMS), chart quoted in comp.sys.ibm.pc',
  author: 'R. C. Brenner',
  year: 'posted on 21 May 1987',
  page: 'not given in the post',
  read: 'secondary',
};

/** Mask of failing bits as IBM's start-up test writes it: bit n as 2^n, 00 for parity (bit 8 of the layouts here). */
const ibmBits = [
  ['00', 8],
  ['01', 0],
  ['02', 1],
  ['04', 2],
  ['08', 3],
  ['10', 4],
  ['20', 5],
  ['40', 6],
  ['80', 7],
] as const;

/** Four banks of nine chips; "aabb 201", aa = address bits 19 to 12 of the block, bb = mask of failing bits. */
export const ibmPc = [
  {
    machine: 'IBM Personal Computer 5150, 16-64 KB system board',
    source: startUpMemoryError,
    bankWords: 0x4000,
    family: 'dynamic-16k-1-three-rail',
    banks: [
      ['00', '03'],
      ['04', '07'],
      ['08', '0B'],
      ['0C', '0F'],
    ],
    beyond: { from: '10', to: '9F', means: 'memory on an expansion card' },
    bits: ibmBits,
    worked: [{ report: '0480 201', bank: 1, bits: [7], source: brenner }],
  },
  {
    machine: 'IBM Personal Computer 5150, 64-256 KB system board',
    source: startUpMemoryError,
    bankWords: 0x10000,
    family: 'dynamic-64k-1',
    banks: [
      ['00', '0F'],
      ['10', '1F'],
      ['20', '2F'],
      ['30', '3F'],
    ],
    beyond: { from: '40', to: '9F', means: 'memory on an expansion card' },
    bits: ibmBits,
    // The report is from a forum thread of 2 October 2006; its bits follow from the arithmetic of the mask.
    worked: [{ report: '1051 201', bank: 1, bits: [0, 4, 6], source: startUpMemoryError }],
  },
] as const;

/** Eight 64K x 1 chips, one bank. */
export const commodore64 = {
  machine: 'Commodore 64, long board',
  source: {
    title: 'memory schematic of the service manual, in commodore-64-memory-repair',
    author: 'valoroso.it',
    year: 'no date',
    page: 'en/commodore-64-memory-repair',
    read: 'secondary',
  },
  socketsFromD0: ['U21', 'U9', 'U22', 'U10', 'U23', 'U11', 'U24', 'U12'],
  // The space on the screen shows as a dollar sign.
  worked: [{ wrote: '20', read: '24', bits: [2], socket: 'U22' }],
} as const;

/** Two banks of eight; write 85 or 170 (decimal), and the value read names the chip. */
export const spectrum48 = {
  machine: 'Sinclair ZX Spectrum 48K',
  source: {
    title: 'Sinclair ZX Spectrum service manual, section 4.8-4.9',
    author: 'Sinclair Research',
    year: 'not given',
    page: '34',
    read: 'read',
  },
  banks: [
    {
      bank: 'lower',
      from: 16384,
      to: 32767,
      socketsFromD0: ['IC6', 'IC7', 'IC8', 'IC9', 'IC10', 'IC11', 'IC12', 'IC13'],
    },
    {
      bank: 'upper',
      from: 32768,
      to: 65535,
      socketsFromD0: ['IC15', 'IC16', 'IC17', 'IC18', 'IC19', 'IC20', 'IC21', 'IC22'],
    },
  ],
  rows: [
    { read85: 84, read170: 171, bit: 0 },
    { read85: 87, read170: 168, bit: 1 },
    { read85: 81, read170: 174, bit: 2 },
    { read85: 93, read170: 162, bit: 3 },
    { read85: 69, read170: 186, bit: 4 },
    { read85: 117, read170: 138, bit: 5 },
    { read85: 21, read170: 234, bit: 6 },
    { read85: 213, read170: 42, bit: 7 },
  ],
  worked: [{ address: 43201, wrote: 170, read: 234, socket: 'IC21' }],
} as const;

/** Two banks of eight 16K x 1. The source gives sockets and no code, so each is named by bank, bit and label. */
export const bbcModelB = {
  machine: 'Acorn BBC Microcomputer Model B',
  source: {
    title: 'DRAM chips, BeebWiki',
    author: 'beebwiki.mdfs.net',
    year: 'no date',
    page: 'DRAM_chips',
    read: 'read',
  },
  banks: [
    { bank: 'CAS0', socketsFromD0: ['IC61', 'IC62', 'IC63', 'IC64', 'IC65', 'IC66', 'IC67', 'IC68'] },
    { bank: 'CAS1', socketsFromD0: ['IC53', 'IC54', 'IC55', 'IC56', 'IC57', 'IC58', 'IC59', 'IC60'] },
  ],
} as const;
