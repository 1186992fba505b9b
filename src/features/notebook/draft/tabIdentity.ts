const lockOf = (tabId: string): string => `tenuity:tab:${tabId}`;

/**
 * A name for this tab that outlives a reload, so that a draft kept by it is found again. It is held as a lock while
 * the tab lives: a duplicated tab, which copies the name, takes another, and drafts of living tabs are left to them.
 */
export function claimTab(): Promise<string> {
  claimed ??= claim();
  return claimed;
}

let claimed: Promise<string> | null = null;

async function claim(): Promise<string> {
  const stored = readSession();
  if (stored !== null && (await hold(stored))) return stored;
  const fresh = Math.random().toString(36).slice(2, 12);
  await hold(fresh);
  try {
    sessionStorage.setItem("tenuity:tab", fresh);
  } catch {
    // Without session storage the name lasts as long as the page.
  }
  return fresh;
}

/** Names of the tabs that are open now; null where the browser can't say. */
export async function livingTabs(): Promise<Set<string> | null> {
  if (typeof navigator === "undefined" || !navigator.locks) return null;
  const { held = [] } = await navigator.locks.query();
  const names = held.map((lock) => lock.name ?? "");
  return new Set(
    names.filter((name) => name.startsWith(lockOf(""))).map((name) => name.slice(lockOf("").length)),
  );
}

function readSession(): string | null {
  try {
    return sessionStorage.getItem("tenuity:tab");
  } catch {
    return null;
  }
}

/** Held until the page goes away; the promise of the lock is left open on purpose. */
function hold(tabId: string): Promise<boolean> {
  if (typeof navigator === "undefined" || !navigator.locks) return Promise.resolve(true);
  return new Promise((resolve) => {
    void navigator.locks.request(lockOf(tabId), { ifAvailable: true }, (lock) => {
      resolve(lock !== null);
      return lock === null ? undefined : new Promise<void>(() => {});
    });
  });
}
