export type ButtonTone = "main" | "plain" | "fault";
export type ButtonSize = "usual" | "small";

const base =
  "inline-flex items-center justify-center gap-8 border rounded font-sans leading-none whitespace-nowrap no-underline transition-colors " +
  "disabled:bg-transparent disabled:text-ink3 disabled:border-dashed disabled:border-rule2 disabled:cursor-not-allowed";

const tones: Record<ButtonTone, string> = {
  main: "enabled:bg-airglow enabled:border-airglow enabled:text-paper font-semibold enabled:hover:bg-[color-mix(in_oklab,var(--airglow)_86%,var(--ink))]",
  plain: "border-rule2 text-ink font-medium enabled:hover:bg-dusk-wash enabled:hover:border-dusk",
  fault: "border-redline text-redline font-medium enabled:hover:bg-redline-wash",
};

const sizes: Record<ButtonSize, string> = {
  usual: "h-36 px-15 pt-1 text-[14.5px]",
  small: "h-30 px-11 text-[13.5px]",
};

/** How a button looks, for whatever element it is. A link has no disabled state, so it goes by `linkClass`. */
export function buttonClass(tone: ButtonTone = "plain", size: ButtonSize = "usual"): string {
  return `${base} ${tones[tone]} ${sizes[size]}`;
}

/** The same for a link that acts as a button. */
export function linkButtonClass(tone: ButtonTone = "plain", size: ButtonSize = "usual"): string {
  return buttonClass(tone, size).replaceAll("enabled:", "");
}
