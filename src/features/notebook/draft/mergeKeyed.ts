/** Three states of an ordered list whose members have keys: as both knew it, as it is here, as it is there. */
export interface ThreeStates<T> {
  base: ReadonlyMap<string, T>;
  mine: ReadonlyMap<string, T>;
  theirs: ReadonlyMap<string, T>;
}

export interface MergedMember<T> {
  key: string;
  base: T | undefined;
  mine: T | undefined;
  theirs: T | undefined;
  /** Who changed it: nobody, one side, both alike, or both differently. */
  change: "none" | "mine" | "theirs" | "alike" | "both";
}

/**
 * Lays three states of a list side by side, in an order that keeps both sides' insertions beside the members they
 * were put after. Members removed by both are left out.
 */
export function mergeKeyed<T>(
  { base, mine, theirs }: ThreeStates<T>,
  isSame: (one: T, other: T) => boolean,
): MergedMember<T>[] {
  const alike = (one: T | undefined, other: T | undefined): boolean =>
    one === undefined || other === undefined ? one === other : isSame(one, other);

  return mergedOrder([...base.keys()], [...mine.keys()], [...theirs.keys()]).map((key) => {
    const member = { key, base: base.get(key), mine: mine.get(key), theirs: theirs.get(key) };
    const changedHere = !alike(member.base, member.mine);
    const changedThere = !alike(member.base, member.theirs);
    const change = changedHere
      ? changedThere
        ? alike(member.mine, member.theirs)
          ? "alike"
          : "both"
        : "mine"
      : changedThere
        ? "theirs"
        : "none";
    return { ...member, change };
  });
}

/** The order of the side that moved members; if both did, the order here. The other side's new members join it. */
function mergedOrder(base: string[], mine: string[], theirs: string[]): string[] {
  const movedHere = hasMoved(base, mine);
  const [lead, other] = movedHere || !hasMoved(base, theirs) ? [mine, theirs] : [theirs, mine];
  const order = [...lead];
  other.forEach((key, index) => {
    if (order.includes(key)) return;
    const before = other
      .slice(0, index)
      .reverse()
      .find((candidate) => order.includes(candidate));
    order.splice(before === undefined ? 0 : order.indexOf(before) + 1, 0, key);
  });
  return order;
}

function hasMoved(base: string[], side: string[]): boolean {
  const kept = new Set(side);
  const known = new Set(base);
  const before = base.filter((key) => kept.has(key));
  const after = side.filter((key) => known.has(key));
  return before.some((key, index) => after[index] !== key);
}
