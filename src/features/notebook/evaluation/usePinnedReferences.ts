import { useEffect, useMemo, useState } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import { pinsOf } from "../../../../shared/notebook/references";
import { suppliedResponse } from "../../../../shared/schemas/references";
import { api } from "../../../lib/api";
import { rememberReferences } from "./knownReferences";

const nothingAsked: ReadonlySet<string> = new Set();

/**
 * Fetches the references that a document pins. False while one is on its way, so that it is not called unknown before
 * the server has said so; one that cannot be had is left to the evaluation, which says it.
 */
export function usePinnedReferences(document: NotebookDocument): boolean {
  const pins = useMemo(() => pinsOf(document).join(","), [document]);
  const [asked, setAsked] = useState(nothingAsked);
  const missing = pins
    .split(",")
    .filter((pin) => pin !== "" && !asked.has(pin))
    .join(",");

  useEffect(
    function fetchReferences() {
      if (missing === "") return;
      const controller = new AbortController();
      const settle = () => setAsked((before) => new Set([...before, ...missing.split(",")]));
      api
        .get(`/references/supplied?pins=${encodeURIComponent(missing)}`, suppliedResponse, { signal: controller.signal })
        .then(rememberReferences)
        .then(settle, () => {
          if (!controller.signal.aborted) settle();
        });
      return () => controller.abort();
    },
    [missing],
  );
  return missing === "";
}
