// Answers a notebook file on the command line: a report to read, or with --json the result document.
import { readFileSync } from "node:fs";
import { evaluateNotebook } from "../shared/notebook/evaluateNotebook";
import { readNotebookFile } from "../shared/notebook/notebookFile";
import { resultDocument } from "../shared/notebook/resultDocument";
import { plainMessage, report } from "./evaluate/report";

const help = `npm run evaluate -- FILE [--json]

Evaluates a notebook file and prints a report.

  --json   print the result document instead: values, tables, profiles and notes, in SI
  --help   print this

Exit code
  0   evaluated, no faults (cautions and remarks are no faults)
  1   the file cannot be read or is no notebook; nothing is printed to standard output
  2   evaluated, but some cell has a fault`;

function main(commandLine: string[]): number {
  const options = commandLine.filter((argument) => argument.startsWith("-"));
  const [file, ...others] = commandLine.filter((argument) => !argument.startsWith("-"));
  if (options.includes("--help")) {
    console.log(help);
    return 0;
  }
  const unknown = options.find((option) => option !== "--json");
  if (unknown !== undefined || file === undefined || others.length > 0) {
    console.error(unknown === undefined ? "One notebook file is needed.\n" : `No option ${unknown}.\n`);
    console.error(help);
    return 1;
  }
  return evaluateFile(file, options.includes("--json"));
}

function evaluateFile(file: string, isJson: boolean): number {
  const text = readText(file);
  if (text === null) return 1;
  let count = 0;
  const reading = readNotebookFile(text, () => `cell-${(count += 1)}`);
  if (!reading.ok) {
    for (const { line, message } of reading.notes)
      console.error(`${file}:${line ?? 1}: ${plainMessage(message)}`);
    return 1;
  }
  const { evaluation } = evaluateNotebook(reading.document);
  console.log(isJson ? JSON.stringify(resultDocument(evaluation), null, 2) : report(reading, evaluation));
  return evaluation.cells.some(({ result }) => result.status === "fault") ? 2 : 0;
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

process.exitCode = main(process.argv.slice(2));
