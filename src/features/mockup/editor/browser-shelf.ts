import { type DraftPlace, type DraftShelf, draftOf, type KeepOutcome, newestFirst, recordOf } from "./draft-shelf.ts";

/*
 * IndexedDB, and not localStorage: that gives an origin five megabytes (HTML Living Standard, "Web storage", disk space),
 * and a sign of a few thousand pieces alone may take more.
 */
const databaseName = "standproud";
const storeName = "drafts";

const keyOf = ({ personId, shop, jobId }: DraftPlace, deskId: string) => [personId, shop, jobId, deskId];

/** The shelf of this browser. It is opened at the first use. */
export function browserShelf(): DraftShelf {
  let opened: Promise<IDBDatabase> | null = null;
  function open(): Promise<IDBDatabase> {
    opened ??= openDatabase(() => {
      opened = null;
    });
    return opened;
  }
  return {
    put: async (place, draft) => {
      try {
        await asOne(await open(), "readwrite", (store) =>
          store.put({ ...place, ...recordOf(draft) }, keyOf(place, draft.deskId)),
        );
        return "kept";
      } catch (error) {
        return whyNotKept(error);
      }
    },
    list: async (place) => {
      // Every key of the place lies between these two: a list sorts after any text.
      const range = [keyOf(place, "").slice(0, 3), [...keyOf(place, "").slice(0, 3), []]] as const;
      try {
        const records = await asOne(await open(), "readonly", (store) =>
          store.getAll(IDBKeyRange.bound(range[0], range[1])),
        );
        return newestFirst(records.map(draftOf).filter((draft) => draft !== null));
      } catch (error) {
        // Said when something is to be kept: without a shelf there is nothing to offer.
        whyNotKept(error);
        return [];
      }
    },
    remove: async (place, deskId) => {
      try {
        await asOne(await open(), "readwrite", (store) => store.delete(keyOf(place, deskId)));
      } catch (error) {
        // Offered once more at worst, and then found to be what the server has.
        whyNotKept(error);
      }
    },
  };
}

/** Throws what is no refusal of the browser. */
function whyNotKept(error: unknown): Exclude<KeepOutcome, "kept"> {
  if (!(error instanceof DOMException)) throw error;
  return error.name === "QuotaExceededError" ? "full" : "forbidden";
}

function openDatabase(onGone: () => void): Promise<IDBDatabase> {
  return new Promise((resolve, reject) => {
    const fail = (error: unknown) => {
      onGone();
      reject(error);
    };
    // Missing where the browser lets pages keep nothing.
    if (!("indexedDB" in globalThis)) {
      fail(new DOMException("This browser keeps nothing for pages.", "SecurityError"));
      return;
    }
    const request = openRequest(fail);
    if (request === null) return;
    request.addEventListener("upgradeneeded", () => request.result.createObjectStore(storeName));
    request.addEventListener("error", () => fail(request.error));
    request.addEventListener("success", () => {
      const database = request.result;
      // A later version of the page, in another tab, wants to change the store.
      database.addEventListener("versionchange", () => {
        onGone();
        database.close();
      });
      database.addEventListener("close", onGone);
      resolve(database);
    });
  });
}

/** Some browsers throw at once where pages may keep nothing. */
function openRequest(fail: (error: unknown) => void): IDBOpenDBRequest | null {
  try {
    return indexedDB.open(databaseName, 1);
  } catch (error) {
    fail(error);
    return null;
  }
}

/** One request in a transaction of its own, done when the transaction is: what is full is said only then. */
function asOne<T>(
  database: IDBDatabase,
  mode: IDBTransactionMode,
  ask: (store: IDBObjectStore) => IDBRequest<T>,
): Promise<T> {
  return new Promise((resolve, reject) => {
    const transaction = database.transaction(storeName, mode);
    const request = ask(transaction.objectStore(storeName));
    transaction.addEventListener("complete", () => resolve(request.result));
    transaction.addEventListener("abort", () => reject(transaction.error ?? request.error));
  });
}
