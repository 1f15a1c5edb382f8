import type { Config } from '@/server/config';

/** Where files of people go; the database keeps their keys. */
export interface ObjectStore {
  /** Rejects unless the bucket is there and the keys open it. */
  readonly check: () => Promise<void>;
  readonly close: () => void;
}

/** An object store that speaks S3. The client is loaded when it is first needed: it is large, and few requests need it. */
export const openObjectStore = async ({ storage }: Config): Promise<ObjectStore> => {
  const { HeadBucketCommand, S3Client } = await import('@aws-sdk/client-s3');
  const client = new S3Client({
    endpoint: storage.endpoint,
    region: storage.region,
    forcePathStyle: true,
    credentials: { accessKeyId: storage.accessKey, secretAccessKey: storage.secretKey },
  });
  return {
    check: async () => {
      await client.send(new HeadBucketCommand({ Bucket: storage.bucket }));
    },
    close: () => client.destroy(),
  };
};
