import { useCallback, useState } from "react";

const prefix = "gangueway.comment.";

function read(name: string): string | null {
  try {
    return localStorage.getItem(prefix + name);
  } catch {
    return null;
  }
}

/** Words that outlive a reload until they are sent or thrown away; null while nothing is being written.
 *  @param name  what they belong to: a plan for a new comment, a comment for its rewording */
export function useKept(name: string): [text: string | null, keep: (text: string | null) => void] {
  const [text, setText] = useState(() => read(name));
  const keep = useCallback(
    (next: string | null) => {
      setText(next);
      try {
        if (next === null || next === "") localStorage.removeItem(prefix + name);
        else localStorage.setItem(prefix + name, next);
      } catch {
        // kept for this page only
      }
    },
    [name],
  );
  return [text, keep];
}
