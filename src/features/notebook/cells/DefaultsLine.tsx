import { Fragment } from "react";
import type { CellEvaluation } from "../../../../shared/notebook/result";

/** What was left out and acts, in one quiet line under the entries. */
export function DefaultsLine({ defaults }: Pick<CellEvaluation, "defaults">) {
  if (defaults.length === 0) return null;
  return (
    <p className="defaults">
      By default{" "}
      {defaults.map(({ key, text }, index) => (
        <Fragment key={key}>
          {index > 0 && (index === defaults.length - 1 ? " and " : ", ")}
          <code>{text}</code>
        </Fragment>
      ))}
      .
    </p>
  );
}
