import { Link, useNavigate } from "react-router-dom";
import type { GroupSummary } from "../../../shared/schemas/groups";
import { failureSentence } from "../../lib/ApiError";
import { useAccount } from "../../lib/session";
import { useTheme } from "../../lib/theme";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Button } from "../../ui/Button";
import { useNotify } from "../../ui/Notices";
import { Page } from "../../ui/Page";
import { RadioLine } from "../../ui/RadioLine";
import { useSignOut } from "./accountQueries";
import { lights } from "./lights";
import { MailChoices } from "./MailChoices";

/** Who one is here, and in which light one reads. */
export function AccountPage({ groups }: { groups: readonly GroupSummary[] }) {
  const account = useAccount();
  const [theme, setTheme] = useTheme();
  const signOut = useSignOut();
  const notify = useNotify();
  const navigate = useNavigate();
  if (!account) return null;

  function handleSignOut() {
    signOut.mutate(undefined, {
      onSuccess: () => void navigate("/notebooks"),
      onError: (error) => notify({ state: "fault", text: `Still signed in. ${failureSentence(error)}` }),
    });
  }

  return (
    <Page title="Account" width={955}>
      <AltitudeRule width={955} className="mt-44 wide:mt-52" />
      <h1 className="pt-28 type-display">{account.name}</h1>
      <p className="pt-8 text-ink2 italic">{partsLine(groups)}</p>

      <AccountSection name="As a person">
        <Line label="Name">{account.name}</Line>
        <Line label="E-mail">{account.email}</Line>
      </AccountSection>

      <AccountSection name="Groups">
        {groups.length === 0 ? (
          <p>
            None yet. <Link to="/groups">Found one</Link>, or be invited by the lead of another.
          </p>
        ) : (
          <>
            {groups.map((group) => (
              <Line key={group.id} label={group.role}>
                <Link to={`/groups/${group.id}`}>{group.name}</Link>
              </Line>
            ))}
            <p className="type-label">
              <Link to="/groups">Found another</Link>
            </p>
          </>
        )}
      </AccountSection>

      <AccountSection name="Reading">
        <Line label="Light">
          <RadioLine label="Light" value={theme} options={lights} onChange={setTheme} />
        </Line>
      </AccountSection>

      <AccountSection name="Mail">
        <MailChoices />
      </AccountSection>

      <AccountSection name="Leaving">
        <div>
          <Button onClick={handleSignOut} busy={signOut.isPending}>
            Sign out
          </Button>
          <p className="pt-8 type-label text-ink3">On this device. Drafts save themselves before.</p>
        </div>
      </AccountSection>
    </Page>
  );
}

function partsLine(groups: readonly GroupSummary[]): string {
  if (groups.length === 0) return "In no group yet";
  const parts = groups
    .map((group) => `${group.role} ${group.role === "lead" ? "of" : "in"} ${group.name}`)
    .join(", ");
  return parts.charAt(0).toUpperCase() + parts.slice(1);
}

function AccountSection({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <section className="head-line mt-44 grid gap-x-28 gap-y-12 pt-22 wide:grid-cols-[212px_minmax(0,1fr)]">
      <h2 className="type-cell-name">{name}</h2>
      <div className="grid gap-12">{children}</div>
    </section>
  );
}

function Line({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <div className="grid gap-x-18 gap-y-2 wide:grid-cols-[140px_minmax(0,1fr)] wide:items-baseline">
      <div className="type-meta text-ink2">{label}</div>
      <div className="type-text">{children}</div>
    </div>
  );
}
