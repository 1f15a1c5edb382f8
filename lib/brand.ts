/** A number that must not be mixed with another of a different meaning. Only the named makers give one. */
type Branded<Name extends string> = number & { readonly __brand: Name };

/** One bit of one bank, counted bank by bank: bank index * data bits + bit. */
export type Lane = Branded<'lane'>;
/** Place of a bank in the layout's list, from 0. */
export type BankIndex = Branded<'bank'>;
/** Bit of a word, from 0. */
export type BitIndex = Branded<'bit'>;
/** Place of a socket in the layout's list, from 0. */
export type SocketIndex = Branded<'socket'>;
/** Address as the CPU sends it. */
export type CpuAddress = Branded<'cpu-address'>;
/** Number of a word inside its bank, from 0. */
export type WordNumber = Branded<'word'>;

export const lane = (n: number) => n as Lane;
export const bankIndex = (n: number) => n as BankIndex;
export const bitIndex = (n: number) => n as BitIndex;
export const socketIndex = (n: number) => n as SocketIndex;
export const cpuAddress = (n: number) => n as CpuAddress;
export const wordNumber = (n: number) => n as WordNumber;
