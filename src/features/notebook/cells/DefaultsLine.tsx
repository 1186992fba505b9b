import { Fragment } from "react";
import type { CellEvaluation } from "../../../../shared/notebook/result";

/** What was left out and acts, and what that means, in one quiet line under the entries. */
export function DefaultsLine({ defaults }: Pick<CellEvaluation, "defaults">) {
  if (defaults.length === 0) return null;
  return (
    <p className="defaults">
      By default{" "}
      {defaults.map(({ key, text, note }, index) => (
        <Fragment key={key}>
          {index > 0 && (index === defaults.length - 1 ? " and " : ", ")}
          <code>{text}</code>
          {note && `, ${note}${index === defaults.length - 2 ? "," : ""}`}
        </Fragment>
      ))}
      .
    </p>
  );
}
