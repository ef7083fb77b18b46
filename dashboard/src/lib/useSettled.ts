import { useEffect, useState } from 'react';

/** A value that follows the given one once it has stood still for so many ms: for asking while a person types. */
export function useSettled<T>(value: T, ms = 200): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return settled;
}
