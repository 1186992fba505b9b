import { cellKinds } from "../../../../shared/notebook/document";
import { cellSchemas } from "../../../../shared/notebook/cellSchemas";
import { TextButton } from "../../../ui/TextButton";
import { ThinningAir } from "../../../ui/ThinningAir";
import type { CellCommands } from "../cells/useCellCommands";

/** A notebook without cells: thinning air, and what can be written first. */
export function EmptySheet({ commands }: { commands: CellCommands | null }) {
  return (
    <div className="pt-44">
      <ThinningAir width={736} height={170} />
      <p className="pt-18">
        {commands ? "Nothing written yet. Begin with a body, then a column over it." : "Nothing written yet."}
      </p>
      {commands && (
        <ul className="empty-kinds">
          {cellKinds.map((kind) => (
            <li key={kind}>
              <TextButton onClick={() => commands.insert(kind, 0)}>{kind}</TextButton>
              <span>{cellSchemas[kind].description}</span>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
