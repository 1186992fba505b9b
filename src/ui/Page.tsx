import { CautionFooter } from "./CautionFooter";

interface PageProps {
  /** Stands in the window's title, before the name of the product. */
  title: string;
  /** Measure of the page in pixels. */
  width?: number;
  children: React.ReactNode;
}

/** What stands under the bar: the page itself and its foot. */
export function Page({ title, width = 1244, children }: PageProps) {
  return (
    <>
      <title>{`${title} · Tenuity`}</title>
      <main
        id="page"
        tabIndex={-1}
        className="mx-auto box-border w-full flex-1 px-18 outline-none wide:px-28"
        style={{ maxWidth: width + 56 }}
      >
        {children}
      </main>
      <CautionFooter
        className="mx-auto box-border w-full px-18 pt-64 pb-64 wide:px-28"
        maxWidth={width + 56}
      />
    </>
  );
}
