/** What stands where a page will be, once waiting for it has become noticeable. */
export function Opening({ what }: { what: string }) {
  return (
    <p
      role="status"
      className="opening mx-auto w-full max-w-[1244px] px-18 pt-44 type-meta text-ink3 wide:px-28"
    >
      Opening {what}…
    </p>
  );
}
