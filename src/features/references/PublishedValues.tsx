import { publishedValues } from "../../../shared/notebook/publishedParts";
import type { KeptResult } from "../../../shared/schemas/results";
import { formatQuantity, quantityRich } from "../../lib/format";
import { Rich } from "../../lib/Rich";

/** Every published number with the name by which another notebook takes it. */
export function PublishedValues({ pin, cells }: { pin: string; cells: KeptResult["cells"] }) {
  const values = Object.entries(publishedValues(cells));
  const bodies = cells.filter(({ kind }) => kind === "body").map(({ name }) => name);
  const example = values[0]?.[0] ?? "name";
  return (
    <section aria-labelledby="values-heading" className="pt-44">
      <h2 id="values-heading" className="type-section">
        Values
      </h2>
      <p className="pb-10 text-ink2">
        The name at the end is what another notebook writes: <code>{`ref(${pin}, ${example})`}</code>
        {bodies.length > 0 && (
          <>
            {"; as the body of a column "}
            <code>{`body = ref(${pin}, ${bodies[0]})`}</code>
          </>
        )}
      </p>
      <div className="reference-scroll" role="region" aria-label="Published values" tabIndex={0}>
        <table className="reference-values">
          <thead>
            <tr>
              <th scope="col">Name</th>
              <th scope="col">Value</th>
            </tr>
          </thead>
          <tbody>
            {values.map(([name, { value, unit }]) => (
              <tr key={name}>
                <th scope="row">
                  <code>{name}</code>
                </th>
                <td>{shown(value, unit)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}

function shown(value: number | string | null, unit: string | undefined): React.ReactNode {
  if (typeof value === "string") return value.replaceAll("_", " ");
  if (value === null) return "–";
  return <Rich text={quantityRich(formatQuantity({ value, unit: unit ?? "1", log10: null }, "SI"))} />;
}
