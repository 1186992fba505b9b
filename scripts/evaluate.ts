// Answers a notebook file on the command line: a report to read, or with --json the result document.
import { readFileSync } from "node:fs";
import { availableParallelism } from "node:os";
import { performance } from "node:perf_hooks";
import { drawRows } from "../shared/notebook/drawRows";
import { evaluateNotebook } from "../shared/notebook/evaluateNotebook";
import { readNotebookFile } from "../shared/notebook/notebookFile";
import type { Evaluation } from "../shared/notebook/result";
import { resultDocument } from "../shared/notebook/resultDocument";
import { progressLine } from "./evaluate/progressLine";
import { plainMessage, report } from "./evaluate/report";
import { readReferences } from "./evaluate/readReferences";
import { runLongTasks } from "./evaluate/runLongTasks";

const help = `npm run evaluate -- FILE [--json] [--draws] [--threads N] [--references FOLDER]

Evaluates a notebook file and prints a report.

  --json       print the result document instead: values, tables, profiles and notes, in SI
  --draws      with --json: a table draws for each spread, with the value of each watched result in each draw
  --threads N  threads for sweeps and spreads; as many as the machine has if left out. The answer is the same
  --references FOLDER
               where what ref(CAR4.2, …) names is looked up: the file CAR4.2.json, which the page of the reference gives
  --help       print this

Sweeps and spreads tell their progress on standard error. Ctrl-C stops them; what is done so far is then answered,
and marked as partial.

Exit code
  0   evaluated, no faults (cautions and remarks are no faults)
  1   the file cannot be read or is no notebook; nothing is printed to standard output
  2   evaluated, but some cell has a fault
  3   stopped early: some sweep or spread is partial`;

interface Wishes {
  file: string;
  isJson: boolean;
  hasDraws: boolean;
  threads: number;
  references: string | null;
}

async function main(commandLine: string[]): Promise<number> {
  if (commandLine.includes("--help")) {
    console.log(help);
    return 0;
  }
  const wishes = readCommandLine(commandLine);
  if (typeof wishes !== "string") return evaluateFile(wishes);
  console.error(`${wishes}\n`);
  console.error(help);
  return 1;
}

/** What is asked for, or what is wrong with it. */
function readCommandLine(commandLine: readonly string[]): Wishes | string {
  const wishes = { isJson: false, hasDraws: false, threads: availableParallelism(), references: null as string | null };
  const files: string[] = [];
  const left = [...commandLine];
  for (let argument = left.shift(); argument !== undefined; argument = left.shift()) {
    if (argument === "--json") wishes.isJson = true;
    else if (argument === "--draws") wishes.hasDraws = true;
    else if (argument === "--threads") {
      wishes.threads = Number(left.shift());
      if (!Number.isInteger(wishes.threads) || wishes.threads < 1)
        return "--threads takes a whole number, 1 or more.";
    } else if (argument === "--references") {
      wishes.references = left.shift() ?? null;
      if (wishes.references === null) return "--references takes a folder.";
    } else if (argument.startsWith("-")) return `No option ${argument}.`;
    else files.push(argument);
  }
  return files.length === 1 ? { ...wishes, file: files[0] } : "One notebook file is needed.";
}

async function evaluateFile({ file, isJson, hasDraws, threads, references: folder }: Wishes): Promise<number> {
  const text = readText(file);
  if (text === null) return 1;
  let count = 0;
  const reading = readNotebookFile(text, () => `cell-${(count += 1)}`);
  if (!reading.ok) {
    for (const { line, message } of reading.notes)
      console.error(`${file}:${line ?? 1}: ${plainMessage(message)}`);
    return 1;
  }
  const { document } = reading;
  const supplied = readReferences(folder, document);
  if (typeof supplied === "string") {
    console.error(supplied);
    return 1;
  }
  const first = evaluateNotebook(document, undefined, undefined, supplied);
  const stop = stopOnSignal();
  const progress = progressLine(process.stderr, () => performance.now());
  const answers = await runLongTasks(document, first.tasks, {
    references: supplied,
    threads,
    onProgress: (task, state) => progress.show(task, state),
    isStopped: stop.isStopped,
  });
  progress.clear();
  const { evaluation } = evaluateNotebook(document, first.memory, answers, supplied);
  const result = resultDocument(evaluation);
  if (hasDraws) {
    for (const task of first.tasks.filter(({ kind }) => kind === "spread")) {
      const place = document.cells.findIndex(({ id }) => id === task.cellId);
      const cell = result.cells[place];
      result.cells[place] = { ...cell, tables: { ...cell.tables, draws: drawRows(answers.get(task.key)!) } };
    }
  }
  console.log(isJson ? JSON.stringify(result, null, 2) : report(reading, evaluation));
  stop.forget();
  if ([...answers.values()].some(({ done, points }) => done < points)) return 3;
  return hasFault(evaluation) ? 2 : 0;
}

function hasFault({ cells }: Evaluation): boolean {
  return cells.some(({ result }) => result.status === "fault");
}

/** One key press may reach the process more than once, by the terminal and by what started it, ms. */
const onePress = 1000;

/** The first interruption asks the work to stop; a second ends the process. */
function stopOnSignal(): { isStopped: () => boolean; forget: () => void } {
  let stoppedAt: number | null = null;
  const handle = () => {
    if (stoppedAt !== null && performance.now() - stoppedAt > onePress) process.exit(130);
    stoppedAt ??= performance.now();
  };
  process.on("SIGINT", handle);
  return { isStopped: () => stoppedAt !== null, forget: () => process.off("SIGINT", handle) };
}

function readText(file: string): string | null {
  try {
    // The mark at the beginning is kept, so that the reader can speak of it.
    return new TextDecoder("utf-8", { fatal: true, ignoreBOM: true }).decode(readFileSync(file));
  } catch (error) {
    const isText = !(error instanceof TypeError);
    console.error(
      isText ? `${file} cannot be read: ${(error as Error).message}` : `${file} is no text in UTF-8.`,
    );
    return null;
  }
}

process.exitCode = await main(process.argv.slice(2));
