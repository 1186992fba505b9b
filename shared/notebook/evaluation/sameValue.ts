/** Whether two plain values (numbers, texts, arrays, typed arrays, records) are equal to the last bit. */
export function sameValue(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true;
  if (typeof one !== "object" || typeof other !== "object" || one === null || other === null) return false;
  if (ArrayBuffer.isView(one) || Array.isArray(one)) {
    const a = one as ArrayLike<unknown>;
    const b = other as ArrayLike<unknown>;
    if (Object.getPrototypeOf(one) !== Object.getPrototypeOf(other) || a.length !== b.length) return false;
    for (let i = 0; i < a.length; i += 1) if (!sameValue(a[i], b[i])) return false;
    return true;
  }
  const a = one as Record<string, unknown>;
  const b = other as Record<string, unknown>;
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => key in b && sameValue(a[key], b[key]));
}
