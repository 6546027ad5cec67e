import { randomUUID } from 'node:crypto';
import { open, rename, rm, type FileHandle } from 'node:fs/promises';
import { dirname, join } from 'node:path';

/** Makes a rename or a new name in `folder` last through a power cut. */
export async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** A file that nobody sees until `publish`; `discard` leaves nothing behind. */
export class PendingFile {
  private constructor(
    readonly path: string,
    private readonly handle: FileHandle,
  ) {}

  static async create(folder: string): Promise<PendingFile> {
    const path = join(folder, randomUUID());
    return new PendingFile(path, await open(path, 'wx'));
  }

  async write(bytes: Uint8Array): Promise<void> {
    let written = 0;
    while (written < bytes.length) {
      written += (await this.handle.write(bytes, written, bytes.length - written)).bytesWritten;
    }
  }

  /** Flushes, then gives the file its name in one step, and makes the name last. */
  async publish(target: string): Promise<void> {
    await this.handle.sync();
    await this.handle.close();
    await rename(this.path, target);
    await syncFolder(dirname(target));
  }

  async discard(): Promise<void> {
    await this.handle.close().catch(() => undefined);
    await rm(this.path, { force: true });
  }
}
