import { HeadBucketCommand } from '@aws-sdk/client-s3';
import { objectStore } from './client';

/** True when the bucket answers within `timeoutMs`. Never throws. */
export async function isObjectStoreHealthy(timeoutMs = 2_000, store = objectStore()): Promise<boolean> {
  try {
    await store.client.send(new HeadBucketCommand({ Bucket: store.bucket }), {
      abortSignal: AbortSignal.timeout(timeoutMs),
    });
    return true;
  } catch {
    return false;
  }
}
