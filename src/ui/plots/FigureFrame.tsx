import { useId, useState, type ReactNode } from "react";
import { figurePng, figureSvg, saveFile, type FigureDrawing } from "./exportFigure";
import { figureCsv, type CsvColumn } from "./figureCsv";
import "./figure.css";

interface FigureFrameProps {
  number: number;
  caption: ReactNode;
  /** Without extension: "ilmara-dayside-density". */
  fileName: string;
  /** Drawn anew for the file: by day, all of it. */
  drawing: () => FigureDrawing;
  columns: () => CsvColumn[];
  children: ReactNode;
}

type FileKind = "SVG" | "PNG" | "CSV";

/** A figure with its caption below: "Figure 1.", what one sees, and the files it can be taken away as. */
export function FigureFrame({ number, caption, fileName, drawing, columns, children }: FigureFrameProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const id = useId();

  const handleSave = async (kind: FileKind) => {
    setFailure(null);
    try {
      if (kind === "CSV") saveFile(new Blob([figureCsv(columns())], { type: "text/csv" }), `${fileName}.csv`);
      else if (kind === "SVG")
        saveFile(new Blob([await figureSvg(drawing())], { type: "image/svg+xml" }), `${fileName}.svg`);
      else saveFile(await figurePng(drawing()), `${fileName}.png`);
    } catch {
      setFailure(`The ${kind} file could not be made. Try again, or take another kind.`);
    }
  };

  return (
    <figure className="figure" aria-labelledby={id}>
      {children}
      <figcaption className="figure-caption">
        <span className="figure-files" data-print="never">
          {(["SVG", "PNG", "CSV"] as const).map((kind) => (
            <button
              key={kind}
              type="button"
              aria-label={`Save figure ${number} as ${kind}`}
              onClick={() => void handleSave(kind)}
            >
              {kind}
            </button>
          ))}
        </span>
        <span id={id}>
          <b>Figure {number}.</b> {caption}
        </span>
        {failure !== null && (
          <span className="figure-failure" role="alert">
            {failure}
          </span>
        )}
      </figcaption>
    </figure>
  );
}
