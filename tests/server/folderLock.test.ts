import { spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { takeFolderLock } from "../../server/folderLock";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "tenuity-lock-"));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const lockFile = () => path.join(folder, "tenuity.lock");

describe("the lock on a data folder", () => {
  it("holds the number of the process and is gone when released", () => {
    const lock = takeFolderLock(folder);
    expect(JSON.parse(readFileSync(lockFile(), "utf8"))).toMatchObject({ pid: process.pid });
    lock.release();
    expect(existsSync(lockFile())).toBe(false);
  });

  it("makes the folder where there is none", () => {
    const deep = path.join(folder, "a/b");
    takeFolderLock(deep).release();
    expect(existsSync(deep)).toBe(true);
  });

  it("refuses a second holder, naming the first and what to do", () => {
    const lock = takeFolderLock(folder);
    expect(() => takeFolderLock(folder)).toThrow(
      new RegExp(`in use by process ${process.pid}.*TENUITY_DATA`),
    );
    lock.release();
    takeFolderLock(folder).release();
  });

  it("takes over from a process that has ended", () => {
    const { pid } = spawnSync(process.execPath, ["-e", ""]);
    writeFileSync(lockFile(), JSON.stringify({ pid, identity: null }));
    takeFolderLock(folder).release();
  });

  it("takes over where the number now belongs to another process", () => {
    writeFileSync(lockFile(), JSON.stringify({ pid: process.ppid, identity: "an-earlier-boot:1" }));
    takeFolderLock(folder).release();
  });

  it("takes over a torn lock file", () => {
    writeFileSync(lockFile(), '{"pid":');
    takeFolderLock(folder).release();
  });
});
