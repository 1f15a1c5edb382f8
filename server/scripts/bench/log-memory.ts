import { buildLayoutIndex, openLogImport } from '@/lib';
import { anyPattern, lineBytes, logBoard, logPattern, logWriter } from './log-lines';

// Prints the MB by which the greatest memory of this process grows while a log of so many MB, which is written piece
// by piece and kept nowhere, is read. What the engine of the language takes for its own compiling is spent before.
const megabytes = Number(process.argv[2]);
const piece = new Uint8Array(lineBytes * 65_536);
const write = logWriter(7, anyPattern);
const greatest = () => process.resourceUsage().maxRSS / 1000;

const feed = (log: ReturnType<typeof openLogImport>, bytes: number) => {
  for (let at = 0; at < bytes; at += piece.length) {
    write(piece);
    log.push(piece);
  }
};

const index = buildLayoutIndex(logBoard());
const warm = openLogImport(index, logPattern);
feed(warm, 4e6);
warm.finish();
const before = greatest();
const log = openLogImport(index, logPattern);
feed(log, megabytes * 1e6);
const { readings } = log.finish();
if (readings * lineBytes < megabytes * 1e6) throw new Error('Not every line was read.');
process.stdout.write(String(greatest() - before));
