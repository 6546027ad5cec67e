import { type DBSchema, type IDBPDatabase, openDB } from 'idb';
import { z } from 'zod';
import { type Draft, draftSchema } from './draft';
import type { WaitingSave } from './waiting-saves';

type Kept = { key: string; userId: string; value: unknown };
interface MarkingDatabase extends DBSchema {
  drafts: { key: string; value: Kept };
  saves: { key: string; value: WaitingSave };
}

let opened: Promise<IDBPDatabase<MarkingDatabase>> | null = null;

function database() {
  opened ??= openDB<MarkingDatabase>('heartcut-marking', 1, {
    upgrade(db) {
      db.createObjectStore('drafts', { keyPath: 'key' });
      db.createObjectStore('saves', { keyPath: 'id' });
    },
    terminated: () => {
      opened = null;
    },
  });
  // A device that refuses today may allow it after the person has changed a setting.
  opened.catch(() => {
    opened = null;
  });
  return opened;
}

/** Drafts belong to a person: the next one on the same device must not find, let alone sign, them. */
const draftKey = (userId: string, evidenceId: string) => `${userId} ${evidenceId}`;

/** The draft of a photo; null when there is none, or when it was written by another version of this page. */
export async function readDraft(userId: string, evidenceId: string): Promise<Draft | null> {
  try {
    const kept = await (await database()).get('drafts', draftKey(userId, evidenceId));
    const parsed = draftSchema.safeParse(kept?.value);
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** False when the device does not keep it (storage switched off or full). */
export async function keepDraft(
  userId: string,
  evidenceId: string,
  draft: Omit<Draft, 'keptAt'>,
): Promise<boolean> {
  const value: Draft = { ...draft, keptAt: new Date().toISOString() };
  try {
    await (await database()).put('drafts', { key: draftKey(userId, evidenceId), userId, value });
    return true;
  } catch {
    return false;
  }
}

/** Drops the draft, unless it was changed after `keptUntil`. */
export async function dropDraft(userId: string, evidenceId: string, keptUntil?: string): Promise<void> {
  try {
    const db = await database();
    const key = draftKey(userId, evidenceId);
    const kept = await db.get('drafts', key);
    const { data } = z.object({ keptAt: z.string() }).safeParse(kept?.value);
    if (!keptUntil || !data || data.keptAt <= keptUntil) await db.delete('drafts', key);
  } catch {
    // Nothing was kept either.
  }
}

/** Where saves wait: on the device, or, where it keeps nothing, in the page as long as it is open. */
export type SaveStore = {
  list: (userId: string) => Promise<WaitingSave[]>;
  put: (save: WaitingSave) => Promise<void>;
  drop: (id: string) => Promise<void>;
};

export function memoryStore(): SaveStore {
  const saves = new Map<string, WaitingSave>();
  return {
    list: async (userId) => [...saves.values()].filter((save) => save.userId === userId),
    put: async (save) => void saves.set(save.id, save),
    drop: async (id) => void saves.delete(id),
  };
}

const deviceStore: SaveStore = {
  list: async (userId) => {
    const all = await (await database()).getAll('saves');
    return all.filter((save) => save.userId === userId).sort((a, b) => a.at.localeCompare(b.at));
  },
  put: async (save) => void (await (await database()).put('saves', save)),
  drop: async (id) => (await database()).delete('saves', id),
};

let inPage: SaveStore | null = null;

export async function saveStore(): Promise<SaveStore> {
  try {
    await database();
    return deviceStore;
  } catch {
    return (inPage ??= memoryStore());
  }
}
