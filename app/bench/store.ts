import type { BenchDay } from '#shared/shop/bench';
import type { CutInput } from '#shared/shop/cut';
import type { Role } from '#shared/types/people';

/** Who the kept day belongs to; no address. */
export interface KeptPerson {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
  readonly shop: string;
  readonly demo: boolean;
}

/** One person's day as it was last fetched. */
export interface KeptDay {
  readonly person: KeptPerson;
  /** ISO 8601, by the tablet's clock. */
  readonly asOf: string;
  readonly day: BenchDay;
}

/** A cut that was logged and has not reached the shop yet. It goes only after the person who logged it signed in. */
export interface QueuedLog {
  /** Order of logging. */
  readonly number?: number;
  readonly personId: string;
  readonly cut: CutInput;
  /** What the shop said against it; null: not sent yet. */
  readonly refused: string | null;
}

/** What the bench keeps on the tablet. */
export interface BenchStore {
  readonly readDay: () => Promise<KeptDay | null>;
  readonly keepDay: (day: KeptDay) => Promise<void>;
  readonly forgetDay: () => Promise<void>;
  /** Logged cuts, the oldest first. */
  readonly logs: () => Promise<readonly QueuedLog[]>;
  readonly addLog: (log: QueuedLog) => Promise<void>;
  readonly changeLog: (log: QueuedLog) => Promise<void>;
  readonly dropLog: (number: number) => Promise<void>;
}

const NAME = 'tallyrail-bench';
const DAY = 'day';
const LOGS = 'logs';

function done<Result>(request: IDBRequest<Result>): Promise<Result> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error ?? new Error('The tablet\'s storage gave no reason.'));
  });
}

function open(): Promise<IDBDatabase> {
  const request = indexedDB.open(NAME, 1);
  request.onupgradeneeded = () => {
    request.result.createObjectStore(DAY);
    request.result.createObjectStore(LOGS, { keyPath: 'number', autoIncrement: true });
  };
  return done(request);
}

/** The tablet's own store: IndexedDB, opened for each use, so that no page holds another one up. */
export function openStore(): BenchStore {
  async function use<Result>(store: string, mode: IDBTransactionMode, act: (store: IDBObjectStore) => IDBRequest<Result>): Promise<Result> {
    const database = await open();
    try {
      const transaction = database.transaction(store, mode);
      const kept = new Promise<void>((resolve, reject) => {
        transaction.oncomplete = () => resolve();
        transaction.onabort = transaction.onerror = () => reject(transaction.error ?? new Error('The tablet\'s storage gave no reason.'));
      });
      const [result] = await Promise.all([done(act(transaction.objectStore(store))), kept]);
      return result;
    } finally {
      database.close();
    }
  }
  return {
    readDay: async () => ((await use<KeptDay | undefined>(DAY, 'readonly', (store) => store.get(DAY))) ?? null),
    keepDay: async (day) => void (await use(DAY, 'readwrite', (store) => store.put(day, DAY))),
    forgetDay: async () => void (await use(DAY, 'readwrite', (store) => store.clear())),
    logs: () => use<QueuedLog[]>(LOGS, 'readonly', (store) => store.getAll()),
    addLog: async (log) => void (await use(LOGS, 'readwrite', (store) => store.add(log))),
    changeLog: async (log) => void (await use(LOGS, 'readwrite', (store) => store.put(log))),
    dropLog: async (number) => void (await use(LOGS, 'readwrite', (store) => store.delete(number))),
  };
}
