import { sampleOfLog } from '@/lib';
import { fileBytes } from './file-bytes';

/** Bytes of the beginning of a log that are looked at to find how its lines are written. */
const sampleBytes = 1 << 18;

function decoderFor(bytes: Uint8Array): TextDecoder {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le');
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be');
  return new TextDecoder('utf-8');
}

/** Lines of the beginning of a file that show how its readings are written. Rejects where it cannot be read. */
export async function readSample(source: Blob): Promise<string[]> {
  const taken = new Uint8Array(sampleBytes);
  let length = 0;
  for await (const bytes of fileBytes(source)) {
    const part = bytes.subarray(0, sampleBytes - length);
    taken.set(part, length);
    length += part.length;
    if (length === sampleBytes) break;
  }
  const text = decoderFor(taken).decode(taken.subarray(0, length));
  // The last line may be cut off.
  return sampleOfLog(length < sampleBytes ? text : text.slice(0, Math.max(text.lastIndexOf('\n'), 0) || undefined));
}
