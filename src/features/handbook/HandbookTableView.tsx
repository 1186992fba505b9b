import { formatUnit, type UnitSystem } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { Rich } from "../../lib/Rich";
import { saveFile } from "../../ui/plots/exportFigure";
import { GasMark } from "../../ui/plots/GasMark";
import { ScrollBox } from "../../ui/tables/ScrollBox";
import { TextButton } from "../../ui/TextButton";
import type { HandbookTable, Sourcing, TableColumn, TableRow, TableValue } from "./handbookTable";
import { columnScale, shownValue } from "./shownNumber";
import { StandingMark } from "./StandingMark";
import { tableCsv, tableJson } from "./tableFiles";

interface HandbookTableViewProps {
  table: HandbookTable;
  /** Gases of the whole table, so that each keeps its line when others are filtered out. */
  gases: readonly string[];
  /** Under which its list of sources stands. */
  sectionId: string;
  numbers: ReadonlyMap<string, number>;
  units: UnitSystem;
  hasCaption: boolean;
  onPut: (row: TableRow) => void;
}

/** One table, with its files under it. */
export function HandbookTableView(props: HandbookTableViewProps) {
  const { table, sectionId, numbers, units, hasCaption, onPut } = props;
  const { caption, rowHead, columns, rows } = table;
  const hasStanding = rows.some(({ standing }) => standing);
  const hasSources = rows.some(({ sources }) => sources);
  const hasForms = rows.some(({ forms }) => forms);
  const refs = (sources: readonly Sourcing[] | undefined) => (
    <SourceRefs sources={sources} numbers={numbers} sectionId={sectionId} />
  );
  return (
    <div className="pt-18">
      {hasCaption && <h3 className="pb-8 type-meta text-ink2">{caption}</h3>}
      <ScrollBox label={caption}>
        <table className="table handbook-table" aria-label={caption}>
          <thead>
            <tr>
              <th scope="col">{rowHead}</th>
              {columns.map((column) => (
                <th key={column.key} scope="col" data-words={isWords(column) || undefined}>
                  <Rich text={column.head} />
                  <ColumnUnit column={column} units={units} />
                </th>
              ))}
              {hasStanding && (
                <th scope="col" data-words>
                  Standing
                </th>
              )}
              {hasSources && <th scope="col">Source</th>}
              {hasForms && (
                <th scope="col">
                  <span className="visually-hidden">Into a notebook</span>
                </th>
              )}
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.key} data-alternative={row.isAlternative || undefined}>
                <th scope="row">
                  <RowHead row={row} gases={props.gases} />
                </th>
                {columns.map((column) => {
                  const value = row.values[column.key] ?? { value: null };
                  return (
                    <td
                      key={column.key}
                      data-words={isWords(column) || undefined}
                      title={everyDigit(value, column)}
                    >
                      <Rich text={shownValue(value, column, units)} />
                      {value.sources && refs(value.sources)}
                    </td>
                  );
                })}
                {hasStanding && (
                  <td data-words>{row.standing && <StandingMark standing={row.standing} />}</td>
                )}
                {hasSources && <td className="handbook-source">{refs(row.sources)}</td>}
                {hasForms && (
                  <td>
                    {row.forms && (
                      <TextButton
                        aria-label={`Put into a notebook: ${row.name}`}
                        onClick={() => onPut(row)}
                        data-print="never"
                      >
                        Put into…
                      </TextButton>
                    )}
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      </ScrollBox>
      <p className="flex gap-12 pt-6" data-print="never">
        <TextButton onClick={() => saveTable(tableCsv(table), table.id, "csv")}>
          CSV <span className="visually-hidden">of {caption}</span>
        </TextButton>
        <TextButton onClick={() => saveTable(tableJson(table), table.id, "json")}>
          JSON <span className="visually-hidden">of {caption}</span>
        </TextButton>
      </p>
    </div>
  );
}

function ColumnUnit({ column, units }: { column: TableColumn; units: UnitSystem }) {
  const unit = formatUnit(columnScale(column, units).unit);
  return (
    unit.length > 0 && (
      <small>
        <Rich text={unit} />
      </small>
    )
  );
}

/** A column of words begins at the left; one of numbers ends at the right. */
const isWords = ({ unit, key }: TableColumn): boolean => unit === "" && key !== "value";

function RowHead({ row, gases }: { row: TableRow; gases: readonly string[] }) {
  if (row.isAlternative)
    return (
      <>
        also <span className="visually-hidden">for {row.name}</span>
      </>
    );
  if (row.gas === undefined) return <Rich text={row.head} />;
  const style = gasStyle(row.gas, gases);
  return (
    <span className="handbook-gas" style={{ color: style.colour }}>
      <GasMark style={style} />
      <span>
        <Rich text={row.head} />
      </span>
    </span>
  );
}

interface SourceRefsProps {
  sources: readonly Sourcing[] | undefined;
  numbers: ReadonlyMap<string, number>;
  sectionId: string;
}

function SourceRefs({ sources = [], numbers, sectionId }: SourceRefsProps) {
  const shown = [...new Set(sources.map(({ source }) => numbers.get(source)!))].sort((a, b) => a - b);
  return (
    <span className="handbook-refs">
      {shown.map((number, index) => (
        <span key={number}>
          {index > 0 && ", "}
          <a href={`#${sectionId}-source-${number}`} aria-label={`source ${number}`}>
            {number}
          </a>
        </span>
      ))}
    </span>
  );
}

function everyDigit({ value, unit: own }: TableValue, { unit }: TableColumn): string | undefined {
  if (typeof value !== "number") return undefined;
  const words = own ?? unit;
  return words === "1" || words === "" ? String(value) : `${value} ${words}`;
}

function saveTable(text: string, id: string, ending: "csv" | "json"): void {
  const type = ending === "csv" ? "text/csv" : "application/json";
  saveFile(new Blob([text], { type: `${type};charset=utf-8` }), `handbook-${id}.${ending}`);
}
