import { useNavigate } from "react-router-dom";
import type { GroupSummary } from "../../../shared/schemas/groups";
import type { Account } from "../../../shared/schemas/session";
import { failureSentence } from "../../lib/ApiError";
import { useTheme } from "../../lib/theme";
import { Chevron } from "../../ui/Chevron";
import { Menu, MenuChoice, MenuItem, MenuLabel, MenuLink, MenuRule } from "../../ui/Menu";
import { useNotify } from "../../ui/Notices";
import { useSignOut } from "./accountQueries";
import { lights } from "./lights";
import { personLine } from "./personLine";

interface AccountMenuProps {
  account: Account;
  groups: readonly GroupSummary[];
}

/** Who is signed in, at the end of the bar, and what they can do about it. */
export function AccountMenu({ account, groups }: AccountMenuProps) {
  return (
    <Menu
      align="end"
      trigger={
        <button
          type="button"
          className="inline-flex max-w-full items-baseline gap-8 border-0 bg-transparent p-0 type-meta text-ink2 transition-colors hover:text-ink"
        >
          <span className="overflow-hidden text-ellipsis whitespace-nowrap">
            {personLine(account.name, groups)}
          </span>
          <Chevron />
        </button>
      }
    >
      <AccountMenuLines account={account} />
    </Menu>
  );
}

/** The lines of that menu, for a menu that holds other things too. */
export function AccountMenuLines({ account }: { account: Account }) {
  const [theme, setTheme] = useTheme();
  const signOut = useSignOut();
  const notify = useNotify();
  const navigate = useNavigate();

  function handleSignOut() {
    signOut.mutate(undefined, {
      onSuccess: () => void navigate("/notebooks"),
      onError: (error) => notify({ state: "fault", text: `Still signed in. ${failureSentence(error)}` }),
    });
  }

  return (
    <>
      <MenuLabel>{account.email}</MenuLabel>
      <MenuLink to="/account">Account</MenuLink>
      <MenuItem onSelect={handleSignOut}>Sign out</MenuItem>
      <MenuRule />
      <MenuLabel>Light</MenuLabel>
      <MenuChoice value={theme} options={lights} onChange={setTheme} />
    </>
  );
}
