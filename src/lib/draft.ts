/** The draft of this device: one circuit in IndexedDB, guarded by a Web Lock so that two tabs never overwrite each other
 *  in silence. Knows nothing of circuits: the record's document is checked by whoever reads it. */

const DATABASE = 'swashbench';
const STORE = 'drafts';
const KEY = 'draft';
/** A draft that this version cannot read is put aside under this key, so that the first edit does not overwrite it. */
const ASIDE = 'unreadable';
/** IndexedDB may not finish while a page is being put away: the last edits also go here, at once. */
const LAST_MOMENT = 'swashbench-draft-last-moment';
const LOCK = 'swashbench-draft';

export interface Draft {
  readonly document: unknown;
  readonly activeCase: string;
  readonly overlays: readonly string[];
  /** Milliseconds since 1970, UTC. */
  readonly savedAt: number;
}

function isDraft(value: unknown): value is Draft {
  if (typeof value !== 'object' || value === null) return false;
  const draft = value as Record<string, unknown>;
  return typeof draft.savedAt === 'number' && typeof draft.activeCase === 'string' && Array.isArray(draft.overlays) && 'document' in draft;
}

function settled<T>(request: IDBRequest<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error ?? new Error('The storage of this device refused.'));
  });
}

let opened: Promise<IDBDatabase> | undefined;

function database(): Promise<IDBDatabase> {
  opened ??= new Promise((resolve, reject) => {
    const request = indexedDB.open(DATABASE, 1);
    request.onupgradeneeded = () => request.result.createObjectStore(STORE);
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error ?? new Error('The storage of this device refused.'));
    request.onblocked = () => reject(new Error('The storage of this device is held by another tab.'));
  });
  opened.catch(() => {
    opened = undefined;
  });
  return opened;
}

/** The newest draft of this device, or null. Rejects when the device offers no storage. */
export async function readDraft(): Promise<Draft | null> {
  const last = readLastMoment();
  const store = (await database()).transaction(STORE, 'readonly').objectStore(STORE);
  const kept: unknown = await settled(store.get(KEY));
  const draft = isDraft(kept) ? kept : null;
  return last && (!draft || last.savedAt > draft.savedAt) ? last : draft;
}

/** Puts a draft aside that cannot be read. */
export function putAside(draft: Draft): Promise<void> {
  return write(draft, ASIDE);
}

/** Keeps the draft; resolves when it is on the device. */
export async function writeDraft(draft: Draft): Promise<void> {
  await write(draft, KEY);
  dropLastMoment();
}

async function write(draft: Draft, key: string): Promise<void> {
  const transaction = (await database()).transaction(STORE, 'readwrite');
  const done = new Promise<void>((resolve, reject) => {
    transaction.oncomplete = () => resolve();
    transaction.onabort = () => reject(transaction.error ?? new Error('The storage of this device is full.'));
    transaction.onerror = () => reject(transaction.error ?? new Error('The storage of this device refused.'));
  });
  transaction.objectStore(STORE).put(draft, key);
  await done;
}

/** Keeps the draft at once, for the moment the page is put away. */
export function writeLastMoment(draft: Draft): void {
  try {
    localStorage.setItem(LAST_MOMENT, JSON.stringify(draft));
  } catch {
    // Full or forbidden: what IndexedDB holds stays.
  }
}

function readLastMoment(): Draft | null {
  try {
    const value: unknown = JSON.parse(localStorage.getItem(LAST_MOMENT) ?? 'null');
    return isDraft(value) ? value : null;
  } catch {
    return null;
  }
}

function dropLastMoment(): void {
  try {
    localStorage.removeItem(LAST_MOMENT);
  } catch {
    // Nothing was kept there.
  }
}

/** Whether this tab is the one that keeps the draft. */
export interface DraftLock {
  /** Takes the keeping over from the other tab. */
  takeOver: () => void;
  release: () => void;
}

/** Asks for the right to keep the draft. `onChange(true)` once this tab has it, `onChange(false)` while another one has it.
 *  When the other tab is closed, this one gets it. Without Web Locks every tab keeps. */
export function holdDraft(onChange: (mine: boolean) => void): DraftLock {
  if (!('locks' in navigator)) {
    onChange(true);
    return { takeOver: () => undefined, release: () => undefined };
  }
  let release: () => void = () => undefined;
  const waiting = new AbortController();
  let closed = false;
  const hold = () =>
    new Promise<void>((resolve) => {
      release = resolve;
      if (!closed) onChange(true);
      if (closed) resolve();
    });

  function wait() {
    navigator.locks.request(LOCK, { signal: waiting.signal }, hold).catch(lost);
  }
  /** Stolen by another tab, or no longer wanted. */
  function lost() {
    if (closed) return;
    onChange(false);
    wait();
  }
  navigator.locks
    .request(LOCK, { ifAvailable: true }, (lock) => {
      if (lock) return hold();
      onChange(false);
      wait();
      return undefined;
    })
    .catch(lost);
  return {
    takeOver: () => {
      navigator.locks.request(LOCK, { steal: true }, hold).catch(lost);
    },
    release: () => {
      closed = true;
      waiting.abort();
      release();
    },
  };
}
