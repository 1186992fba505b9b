/** Waits between tries, in ms; once the network is back the next try comes at once. */
const waits = [1000, 2000, 4000, 8000];

/**
 * Fetches a part of the program that the page can show itself without for a while, such as the figure library. A lost
 * connection is waited out; what fails again and again although there is a connection is given up.
 */
export async function fetchPart<T>(load: () => Promise<T>): Promise<T> {
  for (let tries = 0; ;) {
    try {
      return await load();
    } catch (error) {
      if (navigator.onLine) {
        const wait = waits[tries];
        if (wait === undefined) throw error;
        tries += 1;
        await untilOnlineOr(wait);
      } else {
        await untilOnlineOr(null);
      }
    }
  }
}

/** Until the browser says that it is online again, or that many ms have passed. */
function untilOnlineOr(wait: number | null): Promise<void> {
  return new Promise((resolve) => {
    const timer = wait === null ? undefined : setTimeout(end, wait);
    function end(): void {
      clearTimeout(timer);
      window.removeEventListener("online", end);
      resolve();
    }
    window.addEventListener("online", end);
  });
}
