/** What published tables say of real codes: check values only, copied from the sources that each names. */

/**
 * Motorola MVME1X7P single-board computer: MVME1X7P Computer Hardware User's Manual, Table 4-4, Syndrome Bit Encoding,
 * page 4-36 (read at manualshelf.com, motorola mvme1x7p, page 284; no year given there). The page gives 77 for bit 31,
 * which has even weight and would make double errors look like single ones, so it is left out as a likely misprint.
 */
export const mvmeSyndromes = {
  none: '00',
  data: [
    '4F',
    '4A',
    '52',
    '54',
    '57',
    '58',
    '5B',
    '5D',
    '23',
    '25',
    '26',
    '29',
    '2A',
    '2C',
    '31',
    '34',
    '0E',
    '0B',
    '13',
    '15',
    '16',
    '19',
    '1A',
    '1C',
    '62',
    '64',
    '67',
    '68',
    '6B',
    '6D',
    '70',
  ],
  check: ['01', '02', '04', '08', '10', '20', '40'],
  likelyMisprint: { bit: 31, syndrome: '77' },
} as const;

/**
 * R. W. Hamming, Error detecting and error correcting codes, Bell System Technical Journal 29 (1950) 147-160 (in an
 * encyclopaedia's article on it): the order of the bits, and the positions that each check covers, counted from 1.
 */
export const hamming74 = {
  order: ['p1', 'p2', 'd1', 'p3', 'd2', 'd3', 'd4'],
  covers: { p1: [1, 3, 5, 7], p2: [2, 3, 6, 7], p3: [4, 5, 6, 7] },
} as const;
