const clause: readonly [RegExp, (match: RegExpExecArray) => string][] = [
  [/^always$/, () => "always"],
  [/^on$/, () => "nowhere: it stays on, with a caution"],
  [/^T<(.+)$/, (m) => `below ${m[1]} °C`],
  [/^T>=(.+)$/, (m) => `from ${m[1]} °C up`],
  [/^unless_dosed:(.+)$/, (m) => `unless ${m[1]} is dosed`],
  [/^unless_feed$/, () => "unless it is a feed mineral"],
  [/^as_product$/, () => "as a product"],
  [/^sulfate_couple=off$/, () => "while sulfate reduction is off"],
  [/^role:iron_gangue$/, () => "where iron is gangue"],
];

/** The condition of defaults.csv in words: "T<100" → "below 100 °C". */
export const whenText = (when: string): string =>
  when
    .split(",")
    .map((part) => {
      for (const [pattern, say] of clause) {
        const match = pattern.exec(part.trim());
        if (match) return say(match);
      }
      return part;
    })
    .join(", ");
