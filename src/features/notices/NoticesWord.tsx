import { useQuery } from "@tanstack/react-query";
import { NavLink } from "react-router-dom";
import { noticesQuery } from "../../lib/notices";
import { MenuLink } from "../../ui/Menu";
import { countWords } from "./noticesWords";

function useUnread(): number {
  return useQuery(noticesQuery).data?.unread ?? 0;
}

/** In the bar: a quiet word with how many there are to read. */
export function NoticesWord() {
  const unread = useUnread();
  return (
    <NavLink
      to="/notices"
      className="flex-none type-meta whitespace-nowrap text-ink2 no-underline hover:text-ink aria-[current]:text-ink data-[unread]:font-semibold data-[unread]:text-ink"
      data-unread={unread > 0 || undefined}
    >
      {countWords(unread)}
    </NavLink>
  );
}

/** The same as a line of a menu. */
export function NoticesLine() {
  return <MenuLink to="/notices">{countWords(useUnread())}</MenuLink>;
}
