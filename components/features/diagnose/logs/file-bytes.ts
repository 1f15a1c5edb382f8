/** Bytes that are read of a file at once. */
const slice = 1 << 20;

/** Whether the bytes begin as gzip does (RFC 1952, section 2.3.1). */
async function isGzip(source: Blob): Promise<boolean> {
  const [first, second] = new Uint8Array(await source.slice(0, 2).arrayBuffer());
  return first === 0x1f && second === 0x8b;
}

async function* slices(source: Blob, onRead: (bytes: number) => void): AsyncGenerator<Uint8Array> {
  for (let at = 0; at < source.size; at += slice) {
    const bytes = new Uint8Array(await source.slice(at, at + slice).arrayBuffer());
    onRead(at + bytes.length);
    yield bytes;
  }
}

async function* unpacked(source: Blob, onRead: (bytes: number) => void): AsyncGenerator<Uint8Array> {
  let read = 0;
  const counted = new TransformStream<Uint8Array<ArrayBuffer>, Uint8Array<ArrayBuffer>>({
    transform: (chunk, controller) => {
      read += chunk.length;
      onRead(read);
      controller.enqueue(chunk);
    },
  });
  const reader = source.stream().pipeThrough(counted).pipeThrough(new DecompressionStream('gzip')).getReader();
  try {
    for (let next = await reader.read(); !next.done; next = await reader.read()) yield next.value;
  } finally {
    await reader.cancel().catch(() => undefined);
  }
}

/**
 * The bytes of a file, piece by piece, unpacked where it is gzip. `onRead`: bytes of the file itself so far. Rejects
 * where the file cannot be read any more or its packing is broken.
 */
export async function* fileBytes(source: Blob, onRead: (bytes: number) => void = () => undefined) {
  yield* (await isGzip(source)) ? unpacked(source, onRead) : slices(source, onRead);
}
