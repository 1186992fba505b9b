import { useEffect, useState } from "react";

/** A value once it has rested so long; what is announced aloud should not follow each keystroke. */
export function useSettled<Value>(value: Value, restMs: number): Value {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), restMs);
    return () => clearTimeout(timer);
  }, [value, restMs]);
  return settled;
}
