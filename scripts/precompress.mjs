// Writes FILE.br and FILE.gz beside each file of the built page that gains by it. Runs in `npm run build`.
import { existsSync } from "node:fs";
import { readdir, readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { promisify } from "node:util";
import { brotliCompress, constants, gzip } from "node:zlib";

const compressible = new Set([".html", ".js", ".css", ".svg", ".json", ".txt", ".wasm"]);
const smallest = 1024;

async function compressFile(file) {
  const content = await readFile(file);
  if (content.length < smallest) return;
  const brotli = await promisify(brotliCompress)(content, {
    params: {
      [constants.BROTLI_PARAM_QUALITY]: 9,
      [constants.BROTLI_PARAM_SIZE_HINT]: content.length,
    },
  });
  const gzipped = await promisify(gzip)(content, { level: 9 });
  await writeFile(`${file}.br`, brotli);
  await writeFile(`${file}.gz`, gzipped);
}

/** Compresses a folder's files, two at a time. */
export async function precompress(folder) {
  if (!existsSync(folder)) return;
  const names = await readdir(folder, { recursive: true });
  const files = names
    .filter((name) => compressible.has(path.extname(name)))
    .map((name) => path.join(folder, name));
  const work = files[Symbol.iterator]();
  const run = async () => {
    for (const file of work) await compressFile(file);
  };
  await Promise.all([run(), run()]);
}
