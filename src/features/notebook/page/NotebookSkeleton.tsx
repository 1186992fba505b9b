import { AltitudeRule } from "../../../ui/AltitudeRule";

/** The page while its notebook is on the way: the rules that will stand there, and nothing that will move. */
export function NotebookSkeleton() {
  return (
    <div className="notebook" aria-busy="true">
      <div className="notebook-bar" data-print="never">
        <span className="skeleton-line" style={{ width: 280 }} />
      </div>
      <div className="notebook-grid">
        <div className="strip-pane" />
        <main id="page" className="notebook-sheet">
          <header className="sheet-head">
            <AltitudeRule />
            <p className="kicker" role="status">
              Opening the notebook
            </p>
            <span className="skeleton-line skeleton-title" />
            <span className="skeleton-line" style={{ width: "38%", marginTop: 20 }} />
          </header>
          {[0, 1, 2].map((cell) => (
            <div key={cell} className="cell">
              <div className="cell-head head-line" style={{ minHeight: 42 }} />
              <span className="skeleton-line" style={{ width: "54%" }} />
              <span className="skeleton-line" style={{ width: "47%" }} />
              <span className="skeleton-line" style={{ width: "61%" }} />
            </div>
          ))}
        </main>
      </div>
    </div>
  );
}
