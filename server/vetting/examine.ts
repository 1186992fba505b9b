import { answeredCautions } from "../../shared/notebook/cautionAnswers";
import { givenValues } from "../../shared/notebook/givenValues";
import { engineVersion } from "../../shared/notebook/engine";
import type { Recomputation, VettingCheck } from "../../shared/schemas/vettings";
import type { VersionRow } from "../db/reads/findVersion";

export interface Examined {
  version: Pick<VersionRow, "document" | "result" | "engine">;
  recomputed: Recomputation;
  /** Keys of the cautions whose answers a lead has accepted. */
  accepted: readonly string[];
  openThreads: number;
  isOwnersAlone: boolean;
  groupLeads: number;
  ownerId: string;
  ownerName: string;
  /** The lead who looks. */
  leadId: string;
}

/** The seven checks of a version, each with what it found. All but the accepting of answers is the server's. */
export function examine(examined: Examined): VettingCheck[] {
  return [
    sameNumbers(examined),
    noFaults(examined),
    cautionsAnswered(examined),
    sources(examined),
    noOpenThreads(examined),
    { code: "data_present", verdict: "holds", reason: "It has no attached data." },
    notOwnAlone(examined),
  ];
}

const count = (number: number, one: string, many = `${one}s`): string => `${number} ${number === 1 ? one : many}`;

function sameNumbers({ version, recomputed }: Examined): VettingCheck {
  const { engine, compared, differing, failure } = recomputed;
  const check = (verdict: VettingCheck["verdict"], reason: string): VettingCheck => ({
    code: "same_numbers",
    verdict,
    reason,
  });
  if (failure !== null) return check("fails", `The server could not compute it again. ${failure}`);
  if (version.engine !== engineVersion || engine !== engineVersion)
    return check(
      "fails",
      `It was kept with engine ${version.engine}; the engine is ${engineVersion} now. Keep a new version and ask again.`,
    );
  if (differing.length > 0)
    return check("fails", `Recomputed with engine ${engine}, these differ: ${differing.join("; ")}.`);
  return check("holds", `All ${count(compared, "result")} recomputed with engine ${engine}, equal to the last bit.`);
}

function noFaults({ version }: Examined): VettingCheck {
  const { cells } = version.result;
  const faulty = cells.filter(({ status }) => status === "fault");
  if (faulty.length > 0) {
    const names = faulty.map(({ kind, name }) => name || kind).join(", ");
    return { code: "no_faults", verdict: "fails", reason: `${count(faulty.length, "cell")} with a fault: ${names}.` };
  }
  const remarks = cells.flatMap(({ notes }) => notes).filter(({ level }) => level === "remark").length;
  const reason = `${count(cells.length, "cell")}, none with a fault. ${count(remarks, "remark")}, which ask for nothing.`;
  return { code: "no_faults", verdict: "holds", reason };
}

function cautionsAnswered({ version, accepted }: Examined): VettingCheck {
  const cautions = answeredCautions(version.document, version.result.cells);
  const open = cautions.filter(({ answer, hasLapsed }) => answer === null || hasLapsed);
  const toJudge = cautions.filter(({ key }) => !accepted.includes(key));
  const lapsed = open.filter(({ hasLapsed }) => hasLapsed).length;
  const verdict = open.length > 0 ? "fails" : toJudge.length > 0 ? "to_judge" : "holds";
  const reason =
    cautions.length === 0
      ? "There is no caution to answer."
      : open.length > 0
        ? `${open.length} of ${count(cautions.length, "caution")} ${open.length === 1 ? "has" : "have"} no answer that holds.` +
          (lapsed > 0 ? ` ${count(lapsed, "answer")} lapsed: the numbers moved by over 1 %.` : "")
        : toJudge.length > 0
          ? `${toJudge.length} of ${count(cautions.length, "answer")} ${toJudge.length === 1 ? "is" : "are"} still to be accepted.`
          : `${count(cautions.length, "answer")}, all accepted.`;
  return {
    code: "cautions_answered",
    verdict,
    reason,
    cautions: cautions.map(({ key, cell, note, answer, hasLapsed }) => ({
      key,
      cell,
      message: note.message,
      sentence: hasLapsed ? null : (answer?.sentence ?? null),
      isAccepted: accepted.includes(key),
    })),
  };
}

function sources({ version }: Examined): VettingCheck {
  const given = givenValues(version.document);
  const without = given.filter(({ hasSource }) => !hasSource);
  if (without.length === 0) {
    const reason = `All ${count(given.length, "given value")} say where they come from.`;
    return { code: "sources", verdict: "holds", reason };
  }
  const named = without.slice(0, 8).map(({ cell, key }) => `${key} in ${cell}`);
  const rest = without.length > 8 ? `, and ${without.length - 8} more` : "";
  const reason = `${given.length - without.length} of ${given.length} do. Without a remark that says the source: ${named.join(", ")}${rest}.`;
  return { code: "sources", verdict: "fails", reason };
}

function noOpenThreads({ openThreads }: Examined): VettingCheck {
  if (openThreads === 0) return { code: "no_open_threads", verdict: "holds", reason: "No thread is open." };
  const reason = `${count(openThreads, "thread")} open. Resolve them first.`;
  return { code: "no_open_threads", verdict: "fails", reason };
}

function notOwnAlone({ isOwnersAlone, ownerId, ownerName, leadId, groupLeads }: Examined): VettingCheck {
  const code = "not_own_alone";
  if (!isOwnersAlone || ownerId !== leadId)
    return { code, verdict: "holds", reason: `Owned by ${ownerName}${isOwnersAlone ? " alone" : ", with co-authors"}.` };
  if (groupLeads === 1)
    return {
      code,
      verdict: "holds",
      reason: "It is the lead’s own work, and the group has no other lead. The reference will say so.",
    };
  return { code, verdict: "fails", reason: "It is your own work alone. Ask another lead of the group to vet it." };
}
