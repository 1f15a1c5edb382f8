import { buildLayoutIndex } from '@/lib';
import { benchBoard } from './board';
import { timed } from './measure';

// Prints the ms of the first build of a process, before the engine of the language has compiled anything.
const document = benchBoard(Number(process.argv[2]));
process.stdout.write(String(timed(() => buildLayoutIndex(document))));
