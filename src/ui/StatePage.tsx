import { CautionFooter } from "./CautionFooter";
import { ThinningAir } from "./ThinningAir";

interface StatePageProps {
  /** HTTP status where one says something: 404. */
  number?: number;
  title: string;
  /** What is the case and what can be done. */
  children: React.ReactNode;
  /** Where to go from here. */
  ways?: React.ReactNode;
  /** Faults interrupt those who listen. */
  isFault?: boolean;
}

/** A page that has nothing to show: what is the case on the left, thinning air on the right. */
export function StatePage({ number, title, children, ways, isFault = false }: StatePageProps) {
  return (
    <>
      <title>{`${title} · Tenuity`}</title>
      <main
        id="page"
        tabIndex={-1}
        className="mx-auto grid w-full max-w-[1180px] flex-1 content-start gap-x-64 gap-y-44 px-18 pt-28 pb-64 outline-none wide:grid-cols-[minmax(0,1fr)_minmax(0,520px)] wide:items-end wide:px-28 wide:pt-64"
      >
        <div role={isFault ? "alert" : undefined}>
          {number !== undefined && (
            <p className="font-serif text-[22px]/[30px] font-extralight tracking-[.08em] text-ink3">
              {number}
            </p>
          )}
          <h1 className="type-display">{title}</h1>
          <div className="max-w-[34em] pt-8 type-abstract wide:text-[19px]/[30px]">{children}</div>
          {ways && (
            <div className="flex flex-wrap items-center gap-x-18 gap-y-12 pt-18 font-sans text-[15px]">
              {ways}
            </div>
          )}
        </div>
        <ThinningAir width={520} height={330} />
      </main>
      <CautionFooter className="mx-auto w-full px-18 pb-64 wide:px-28" maxWidth={1180} />
    </>
  );
}
