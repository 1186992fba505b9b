/** The numbers of one table or list are one stop of the Tab key; arrows go from one to the next. */

const groupOf = (number: Element): Element | null => number.closest("table, dl");

const numbersIn = (group: Element): HTMLElement[] => [
  ...group.querySelectorAll<HTMLElement>(".explain-number"),
];

/** Makes a number the stop of its group, if the group has none; returns what gives the stop on when the number goes. */
export function joinNumberGroup(number: HTMLElement): () => void {
  const group = groupOf(number);
  const hasStop = group !== null && numbersIn(group).some((other) => other.tabIndex === 0);
  number.tabIndex = hasStop ? -1 : 0;
  return () => {
    if (group === null || number.tabIndex !== 0) return;
    const next = numbersIn(group).find((other) => other !== number);
    if (next) next.tabIndex = 0;
  };
}

/** Whether the key led to another number, which then has the focus. */
export function moveToNumber(number: HTMLElement, key: string): boolean {
  const next = numberAt(number, key);
  if (!next || next === number) return false;
  for (const other of numbersIn(groupOf(number)!)) other.tabIndex = -1;
  next.tabIndex = 0;
  next.focus();
  return true;
}

function numberAt(number: HTMLElement, key: string): HTMLElement | undefined {
  const group = groupOf(number);
  if (!group) return undefined;
  const numbers = numbersIn(group);
  const place = numbers.indexOf(number);
  switch (key) {
    case "ArrowRight":
      return numbers[place + 1];
    case "ArrowLeft":
      return numbers[place - 1];
    case "Home":
      return numbers[0];
    case "End":
      return numbers[numbers.length - 1];
    case "ArrowDown":
      return acrossRows(number, numbers.slice(place + 1));
    case "ArrowUp":
      return acrossRows(number, numbers.slice(0, place).reverse());
    default:
      return undefined;
  }
}

/** The nearest one in the same column of a table; in a list, the next. */
function acrossRows(number: HTMLElement, candidates: readonly HTMLElement[]): HTMLElement | undefined {
  const column = number.closest("td")?.cellIndex;
  return candidates.find((other) => other.closest("td")?.cellIndex === column);
}
