import type { Theme } from "../../lib/theme";

/** The lights a page can stand in, as they are called. */
export const lights: readonly { value: Theme; label: string }[] = [
  { value: "system", label: "as the device" },
  { value: "light", label: "day" },
  { value: "dark", label: "night" },
];
