interface TextButtonProps extends React.ComponentProps<"button"> {
  tone?: "dusk" | "fault";
}

/** A verb that is pressed but reads as a word: Put back, show, Remove. */
export function TextButton({ tone = "dusk", className = "", ...rest }: TextButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      className={
        "border-0 bg-transparent p-0 font-sans text-[13.5px]/[20px] font-medium underline decoration-transparent underline-offset-[.18em] transition-colors hover:decoration-current disabled:cursor-not-allowed disabled:text-ink3 disabled:hover:decoration-transparent " +
        `${tone === "fault" ? "text-redline" : "text-dusk"} ${className}`
      }
    />
  );
}
