import { mkdirSync } from 'node:fs';
import S3rver from 's3rver';

/** The bucket, and the keys that the fake takes; they open nothing but the fake. */
export const localStore = { bucket: 'rowcall', accessKey: 'S3RVER', secretKey: 'S3RVER' };

/**
 * Starts a server on loopback that speaks S3 and keeps the objects as files in `folder`.
 *
 * @param {{ port: number, folder: string }} options
 * @returns {Promise<{ stop: () => Promise<void> }>}
 */
export const startObjectStore = async ({ port, folder }) => {
  mkdirSync(folder, { recursive: true });
  const server = new S3rver({
    address: '127.0.0.1',
    port,
    directory: folder,
    silent: true,
    configureBuckets: [{ name: localStore.bucket, configs: [] }],
  });
  await server.run();
  return { stop: () => server.close() };
};
