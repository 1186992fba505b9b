import { Mark } from "../../ui/Mark";
import { Wordmark } from "../../ui/Wordmark";
import { cautionText } from "../../../shared/notebook/cautionText";
import { useIsWide } from "../../ui/useIsWide";
import { LimbArt } from "./LimbArt";
import type { Box } from "./limbDrawing";

/** Where the name and its line stand over the art, in pixels. */
const wideLettering: readonly Box[] = [{ left: 44, top: 52, right: 492, bottom: 236 }];
const narrowLettering: readonly Box[] = [{ left: 8, top: 18, right: 372, bottom: 132 }];

interface SignInFrameProps {
  title: string;
  children: React.ReactNode;
}

/** The page before the pages: the limb, the name, and a panel to sign in or create an account. */
export function SignInFrame({ title, children }: SignInFrameProps) {
  const isWide = useIsWide();
  return (
    <div className="grid min-h-dvh wide:grid-cols-[minmax(0,1fr)_460px]">
      <title>{`${title} · Tenuity`}</title>
      <header className="relative min-h-330 overflow-hidden wide:sticky wide:top-0 wide:h-dvh wide:min-h-640">
        <LimbArt lettering={isWide ? wideLettering : narrowLettering} />
        <div className="absolute top-26 left-18 wide:top-58 wide:left-64">
          <Wordmark size={isWide ? 112 : 66} className="-ml-4 block wide:-ml-6" />
          <p className="pt-8 font-serif text-[18px]/[24px] italic wide:pt-14 wide:text-[23px]/[30px]">
            Notebooks for the air that thins into space
          </p>
        </div>
        <p className="absolute right-18 bottom-12 left-18 font-sans text-[12px]/[16px] text-[#c9d2e6] wide:right-auto wide:bottom-26 wide:left-64 wide:max-w-[52ch] wide:text-[13px]/[19px]">
          Limb of Ilmara after dusk. Layers and exobase to scale
          <span className="hidden wide:inline">; particles thin out as its densities do</span>.
        </p>
      </header>
      <div className="flex flex-col px-18 pt-12 pb-28 wide:px-56 wide:pt-28">
        <main className="my-auto w-full max-w-[460px] pb-18 wide:pt-12">
          <Mark size={40} className="hidden wide:block" />
          {children}
        </main>
        <footer className="border-t border-rule pt-12">
          <p className="font-sans text-[12px]/[17px] text-ink3">{cautionText}</p>
        </footer>
      </div>
    </div>
  );
}
