/** One process at a time on a data folder: PGlite itself would not notice a second one and would lose rows. */
import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, unlinkSync, writeFileSync } from "node:fs";
import path from "node:path";

interface Holder {
  pid: number;
  /** Tells two processes with the same number apart, as after a restart of the machine; null where unknown. */
  identity: string | null;
}

export interface FolderLock {
  release(): void;
}

/** Boot of the machine and start of the process (field 22 of /proc/…/stat), where the system tells. */
function identityOf(pid: number): string | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    const afterName = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    return `${readFileSync("/proc/sys/kernel/random/boot_id", "utf8").trim()}:${afterName[19]}`;
  } catch {
    return null;
  }
}

function isRunning(holder: Holder): boolean {
  if (holder.pid === process.pid && holder.identity === identityOf(process.pid)) return true;
  try {
    process.kill(holder.pid, 0);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === "ESRCH") return false;
  }
  return holder.identity === null || holder.identity === identityOf(holder.pid);
}

/** The holder written in a lock file, or null where it is gone or torn. */
function readHolder(file: string): Holder | null {
  try {
    const { pid, identity } = JSON.parse(readFileSync(file, "utf8")) as Partial<Holder>;
    return typeof pid === "number" && pid > 0 ? { pid, identity: identity ?? null } : null;
  } catch {
    return null;
  }
}

/**
 * Takes the lock file `tenuity.lock` in `folder`, beside the database's own folder. A lock whose process has ended,
 * as after a power cut, is taken over.
 *
 * @throws Error naming the process that has the folder
 */
export function takeFolderLock(folder: string): FolderLock {
  mkdirSync(folder, { recursive: true });
  const file = path.join(folder, "tenuity.lock");
  const own = `${file}.${process.pid}`;
  writeFileSync(
    own,
    JSON.stringify({ pid: process.pid, identity: identityOf(process.pid) } satisfies Holder),
  );

  try {
    for (let attempt = 0; attempt < 5; attempt += 1) {
      try {
        // A hard link appears whole or not at all, and never over another.
        linkSync(own, file);
        return { release: () => rmSync(file, { force: true }) };
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code !== "EEXIST") throw error;
      }
      const holder = readHolder(file);
      if (holder && isRunning(holder)) break;
      discardStaleLock(file, holder);
    }
  } finally {
    unlinkSync(own);
  }
  const holder = readHolder(file);
  throw new Error(
    `The data folder ${path.resolve(folder)} is in use by process ${holder?.pid ?? "(unknown)"}. ` +
      "Stop that process first, or set TENUITY_DATA to another folder.",
  );
}

/** Sets a lock aside and, if another process renewed it in the meantime, puts it back. */
function discardStaleLock(file: string, stale: Holder | null): void {
  const aside = `${file}.${process.pid}.stale`;
  try {
    renameSync(file, aside);
  } catch {
    return;
  }
  const taken = readHolder(aside);
  if (taken && (taken.pid !== stale?.pid || taken.identity !== stale.identity)) {
    try {
      linkSync(aside, file);
    } catch {
      // A third process has it by now.
    }
  }
  rmSync(aside, { force: true });
}
