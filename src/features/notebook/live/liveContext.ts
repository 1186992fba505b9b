import { createContext } from "react";
import type { PresentPerson } from "../../../../shared/schemas/live";

export interface LiveNotebook {
  /** Others who have the notebook open. */
  others: readonly PresentPerson[];
  /** Says at which cell one is. */
  moveTo: (cellId: string | null) => void;
}

export const LiveContext = createContext<LiveNotebook>({ others: [], moveTo: () => {} });
