import { Link, NavLink } from "react-router-dom";
import { Mark } from "./Mark";
import { Menu, MenuLink, MenuRule } from "./Menu";
import { TextButton } from "./TextButton";
import { Wordmark } from "./Wordmark";

export interface PagePlace {
  to: string;
  label: string;
}

interface PageFrameProps {
  /** The places of the bar. */
  places: readonly PagePlace[];
  /** At the right of the bar: who is signed in. */
  person?: React.ReactNode;
  /** The same as lines of the menu that a narrow page has instead. */
  personMenu?: React.ReactNode;
  children: React.ReactNode;
}

/** The bar over a `Page`. The notebook page has a bar of its own. */
export function PageFrame({ places, person, personMenu, children }: PageFrameProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#page"
        className="visually-hidden focus:fixed focus:top-8 focus:left-8 focus:z-50 focus:m-0 focus:h-auto focus:w-auto focus:bg-raised focus:px-12 focus:py-8 focus:[clip-path:none]"
      >
        Go to the page
      </a>
      <header
        data-print="never"
        className="sticky top-0 z-20 flex h-(--bar-height) flex-none items-center gap-44 border-b border-rule bg-paper px-16 font-sans wide:pr-28 wide:pl-20"
      >
        <Link
          to="/"
          aria-label="Tenuity, all notebooks"
          className="flex items-center gap-10 text-ink no-underline"
        >
          <Mark size={28} />
          <Wordmark size={25} />
        </Link>
        <nav aria-label="Main" className="hidden h-full items-stretch gap-26 text-[15px]/[20px] wide:flex">
          {places.map((place) => (
            <NavLink
              key={place.to}
              to={place.to}
              className="flex items-center border-b-2 border-transparent pt-2 text-dusk no-underline transition-colors hover:border-dusk aria-[current]:border-airglow aria-[current]:font-semibold aria-[current]:text-ink"
            >
              {place.label}
            </NavLink>
          ))}
        </nav>
        <div className="ml-auto hidden min-w-0 wide:block">{person}</div>
        <div className="ml-auto wide:hidden">
          {(places.length > 0 || personMenu) && (
            <Menu align="end" trigger={<TextButton className="text-[14.5px]">Menu</TextButton>}>
              {places.map((place) => (
                <MenuLink key={place.to} to={place.to}>
                  {place.label}
                </MenuLink>
              ))}
              {personMenu && <MenuRule />}
              {personMenu}
            </Menu>
          )}
        </div>
      </header>
      {children}
    </div>
  );
}
